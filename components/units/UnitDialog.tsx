'use client';

import { useRouter } from 'next/navigation';
import { useState, type FormEvent, type ReactNode } from 'react';
import { Button } from '@/components/ui/Button';
import type { ButtonKind } from '@/components/ui/button-style';
import { Dialog } from '@/components/ui/Dialog';
import { Notice } from '@/components/ui/Notice';
import { useToast } from '@/components/ui/Toast';
import { fieldError, formError, type Answer } from '@/lib/client/api';
import { useSend } from '@/lib/client/use-send';

/**
 * A button that asks something in a dialog and sends the answer. `fields` are the paths that the dialog shows errors
 * at itself; whatever else is refused stands above them.
 */
export function UnitDialog({
  button,
  title,
  confirm,
  kind = 'secondary',
  danger = false,
  fields,
  done,
  submit,
  children,
}: {
  button: string;
  title: string;
  confirm: string;
  kind?: ButtonKind;
  danger?: boolean;
  fields: readonly string[];
  done: string;
  submit: (form: HTMLFormElement) => Promise<Answer<unknown>>;
  children: (error: (path: string) => string | undefined) => ReactNode;
}) {
  const router = useRouter();
  const toast = useToast();
  const [open, setOpen] = useState(false);
  const { busy, failure, run, forget } = useSend();
  const close = () => {
    setOpen(false);
    forget();
  };
  async function carryOut(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const form = event.currentTarget;
    if (!(await run(() => submit(form)))) return;
    close();
    toast({ text: done });
    router.refresh();
  }
  const other = formError(failure, fields);
  return (
    <>
      <Button kind={kind} onClick={() => setOpen(true)}>
        {button}
      </Button>
      <Dialog open={open} onClose={close} title={title} sheet>
        {open ? (
          <form noValidate className="grid gap-5" onSubmit={(event) => void carryOut(event)}>
            {other ? <Notice tone="danger">{other}</Notice> : null}
            {children((path) => fieldError(failure, path))}
            <div className="flex flex-wrap justify-end gap-3">
              <Button onClick={close}>Cancel</Button>
              <Button type="submit" kind={danger ? 'danger' : 'primary'} busy={busy}>
                {confirm}
              </Button>
            </div>
          </form>
        ) : null}
      </Dialog>
    </>
  );
}

export type NamedUnit = { id: string; fleetNumber: string };
