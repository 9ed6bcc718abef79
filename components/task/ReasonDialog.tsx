'use client';

import { useRouter } from 'next/navigation';
import { useState, type FormEvent, type ReactNode } from 'react';
import { Button } from '@/components/ui/Button';
import { Dialog } from '@/components/ui/Dialog';
import { Notice } from '@/components/ui/Notice';
import { Textarea } from '@/components/ui/Textarea';
import { fieldError, formError, send } from '@/lib/client/api';
import { useSend } from '@/lib/client/use-send';

/** A button for what is kept on record with its reason: asks for that, then sends it to `path`. */
export function ReasonDialog({
  path,
  button,
  title,
  children,
}: {
  path: string;
  button: string;
  title: string;
  children: ReactNode;
}) {
  const { busy, failure, run, forget } = useSend();
  const [open, setOpen] = useState(false);
  const [reason, setReason] = useState('');
  const router = useRouter();
  const close = () => {
    setOpen(false);
    forget();
  };
  async function submit(event: FormEvent): Promise<void> {
    event.preventDefault();
    if (!(await run(() => send('POST', path, { reason })))) return;
    close();
    setReason('');
    router.refresh();
  }
  const error = formError(failure, ['reason']);
  return (
    <>
      <Button onClick={() => setOpen(true)}>{button}</Button>
      <Dialog open={open} onClose={close} title={title}>
        <form onSubmit={(event) => void submit(event)} noValidate className="grid gap-4">
          {children}
          {error ? <Notice tone="danger">{error}</Notice> : null}
          <Textarea
            label="Reason"
            rows={3}
            value={reason}
            error={fieldError(failure, 'reason')}
            onChange={(event) => setReason(event.target.value)}
          />
          <div className="flex flex-wrap gap-2">
            <Button type="submit" kind="danger" busy={busy}>
              {button}
            </Button>
            <Button onClick={close}>Leave it</Button>
          </div>
        </form>
      </Dialog>
    </>
  );
}
