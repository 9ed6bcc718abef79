'use client';

import { useState } from 'react';
import { Button } from '@/components/ui/Button';
import { Checkbox } from '@/components/ui/Checkbox';
import { Notice } from '@/components/ui/Notice';
import { useToast } from '@/components/ui/Toast';
import { formError, send } from '@/lib/client/api';
import { useSend } from '@/lib/client/use-send';
import type { DigestSending } from '@/lib/schemas/digest';

/** Whether the digest comes on Mondays, and sending it now. Both act at once and say what they did. */
export function DigestControls({ wanted: before, email }: { wanted: boolean; email: string }) {
  const [wanted, setWanted] = useState(before);
  const [sent, setSent] = useState<DigestSending | null>(null);
  const toast = useToast();
  const { busy, failure, run } = useSend();

  async function change(next: boolean) {
    setWanted(next);
    if (await run(() => send('PATCH', '/api/v1/account', { digestWanted: next })))
      toast({
        text: next ? `The digest comes on Mondays, to ${email}.` : 'The digest does not come any more.',
      });
    else setWanted(!next);
  }
  async function sendNow() {
    const answer = await run(() => send<DigestSending>('POST', '/api/v1/digest/sending'));
    if (!answer) return;
    setSent(answer.data);
    toast({ text: `On its way to ${answer.data.to}.` });
  }
  const error = formError(failure, []);
  return (
    <div className="grid gap-3">
      {error ? <Notice tone="danger">{error}</Notice> : null}
      <div className="flex flex-wrap items-start justify-between gap-x-8 gap-y-3">
        <Checkbox
          name="digestWanted"
          label="Send me this every Monday"
          hint={`From 06:00, once it is Monday at all your docks. To ${email}.`}
          checked={wanted}
          disabled={busy}
          onChange={(event) => void change(event.target.checked)}
        />
        <Button kind="primary" busy={busy} onClick={() => void sendNow()}>
          Send me this now
        </Button>
      </div>
      {sent?.mailboxUrl ? (
        <p>
          No mail leaves this machine.{' '}
          <a href={sent.mailboxUrl} target="_blank" rel="noreferrer" className="inline-block py-2 underline">
            Open the local mailbox
          </a>
        </p>
      ) : null}
    </div>
  );
}
