'use client';

import { useRouter } from 'next/navigation';
import type { FormEvent } from 'react';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import { Textarea } from '@/components/ui/Textarea';
import { useToast } from '@/components/ui/Toast';
import { fieldError, formError, send } from '@/lib/client/api';
import { textOf } from '@/lib/client/form-values';
import { useSend } from '@/lib/client/use-send';
import type { Reading } from '@/lib/schemas/reading';

/** Says that a reading is right after all. */
export function AcceptForm({ reading, onDone }: { reading: Reading; onDone: () => void }) {
  const router = useRouter();
  const toast = useToast();
  const { busy, failure, run } = useSend();
  async function submit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const note = textOf(event.currentTarget, 'note');
    const answer = await run(() =>
      send('POST', `/api/v1/readings/${reading.id}/review`, note ? { note } : {}),
    );
    if (!answer) return;
    toast({ text: `The reading of ${reading.fleetNumber} is accepted.` });
    onDone();
    router.refresh();
  }
  const error = formError(failure, ['note']);
  return (
    <form onSubmit={(event) => void submit(event)} noValidate className="grid gap-5">
      {error ? <Notice tone="danger">{error}</Notice> : null}
      <Textarea
        name="note"
        label="Note"
        optional
        rows={3}
        maxLength={500}
        error={fieldError(failure, 'note')}
      />
      <Button type="submit" kind="primary" size="large" busy={busy}>
        Accept the reading
      </Button>
    </form>
  );
}
