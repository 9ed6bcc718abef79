'use client';

import { useRouter } from 'next/navigation';
import { useState } from 'react';
import { Button } from '@/components/ui/Button';
import { Dialog } from '@/components/ui/Dialog';
import { Notice } from '@/components/ui/Notice';
import { useToast } from '@/components/ui/Toast';
import { send } from '@/lib/client/api';
import { useSend } from '@/lib/client/use-send';
import type { Procedure } from '@/lib/schemas/procedure';

/** Takes a procedure out of use, for good: asks first. */
export function RetireProcedure({ procedure }: { procedure: Pick<Procedure, 'id' | 'name'> }) {
  const { busy, failure, run, forget } = useSend();
  const [open, setOpen] = useState(false);
  const router = useRouter();
  const toast = useToast();
  const close = () => {
    setOpen(false);
    forget();
  };
  async function retire(): Promise<void> {
    if (!(await run(() => send('POST', `/api/v1/procedures/${procedure.id}/retirement`)))) return;
    close();
    toast({ text: `${procedure.name} is retired.` });
    router.refresh();
  }
  return (
    <>
      <Button onClick={() => setOpen(true)}>Retire</Button>
      <Dialog open={open} onClose={close} title={`Retire ${procedure.name}?`}>
        <div className="grid gap-4">
          <p>
            No rule and no new task can follow it any more, and it does not come back. Tasks that were opened
            with it keep it.
          </p>
          {failure ? <Notice tone="danger">{failure.detail}</Notice> : null}
          <div className="flex flex-wrap gap-2">
            <Button kind="danger" busy={busy} onClick={() => void retire()}>
              Retire
            </Button>
            <Button onClick={close}>Leave it</Button>
          </div>
        </div>
      </Dialog>
    </>
  );
}
