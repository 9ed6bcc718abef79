'use client';

import { useRouter } from 'next/navigation';
import { useState, type FormEvent } from 'react';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import { Textarea } from '@/components/ui/Textarea';
import { fieldError, formError, send } from '@/lib/client/api';
import { useSend } from '@/lib/client/use-send';

/** Writes a note on a task. Notes are never edited. */
export function NoteForm({ taskId }: { taskId: string }) {
  const { busy, failure, run } = useSend();
  const [text, setText] = useState('');
  const router = useRouter();
  async function submit(event: FormEvent): Promise<void> {
    event.preventDefault();
    if (!(await run(() => send('POST', `/api/v1/tasks/${taskId}/notes`, { text })))) return;
    setText('');
    router.refresh();
  }
  const error = formError(failure, ['text']);
  return (
    <form onSubmit={(event) => void submit(event)} noValidate className="grid gap-3">
      {error ? <Notice tone="danger">{error}</Notice> : null}
      <Textarea
        name="text"
        label="New note"
        rows={3}
        value={text}
        error={fieldError(failure, 'text')}
        onChange={(event) => setText(event.target.value)}
      />
      <div>
        <Button type="submit" busy={busy}>
          Write note
        </Button>
      </div>
    </form>
  );
}
