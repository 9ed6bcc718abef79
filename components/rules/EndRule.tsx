'use client';

import { useRouter } from 'next/navigation';
import { useState } from 'react';
import { Button } from '@/components/ui/Button';
import { Dialog } from '@/components/ui/Dialog';
import { Textarea } from '@/components/ui/Textarea';
import { useToast } from '@/components/ui/Toast';
import { send } from '@/lib/client/api';
import type { Rule } from '@/lib/schemas/rule';

/** Ends a rule after asking, or opens an ended one again. */
export function EndRule({ rule }: { rule: Rule }) {
  const router = useRouter();
  const toast = useToast();
  const [asking, setAsking] = useState(false);
  const [reason, setReason] = useState('');
  const [error, setError] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);

  const run = async (method: 'POST' | 'DELETE', done: string) => {
    setBusy(true);
    const body = method === 'POST' ? { reason } : undefined;
    const answer = await send<Rule>(method, `/api/v1/rules/${rule.id}/ending`, body);
    setBusy(false);
    if (!answer.ok) return setError(answer.errors.map(({ message }) => message).join('; ') || answer.detail);
    setAsking(false);
    setError(null);
    toast({ text: done });
    router.refresh();
  };

  if (rule.endedAt)
    return (
      <div className="grid gap-2">
        <Button busy={busy} onClick={() => void run('DELETE', `“${rule.name}” is in force again.`)}>
          Open the rule again
        </Button>
        {error ? (
          <p role="alert" className="font-semibold text-danger">
            {error}
          </p>
        ) : null}
      </div>
    );
  return (
    <>
      <Button onClick={() => setAsking(true)}>End the rule</Button>
      <Dialog
        open={asking}
        onClose={() => setAsking(false)}
        title={`End “${rule.name}”?`}
        footer={
          <>
            <Button onClick={() => setAsking(false)}>Keep it</Button>
            <Button
              kind="danger"
              busy={busy}
              onClick={() => void run('POST', `“${rule.name}” has ended. It holds no unit any more.`)}
            >
              End the rule
            </Button>
          </>
        }
      >
        <div className="grid gap-4">
          <p>
            It makes nothing due and holds no unit from now on. What was done under it is kept, and it can be
            opened again.
          </p>
          <Textarea
            label="Reason"
            optional
            id="end-reason"
            rows={2}
            maxLength={500}
            value={reason}
            error={error}
            onChange={(event) => setReason(event.target.value)}
          />
        </div>
      </Dialog>
    </>
  );
}
