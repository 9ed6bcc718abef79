'use client';

import { useRouter } from 'next/navigation';
import { useState, type FormEvent } from 'react';
import { Button } from '@/components/ui/Button';
import { Dialog } from '@/components/ui/Dialog';
import { Notice } from '@/components/ui/Notice';
import { TextInput } from '@/components/ui/TextInput';
import { useToast } from '@/components/ui/Toast';
import { fieldError, formError, send, type Answer } from '@/lib/client/api';
import { textOf } from '@/lib/client/form-values';
import { useSend } from '@/lib/client/use-send';
import type { Person } from '@/lib/schemas/person';
import { noDock } from './InviteForm';
import { readRoleAndDocks, RoleAndDocks } from './RoleAndDocks';
import type { NamedDock } from './words';

/** The button at a person's line, and what may be changed about them. */
export function ChangePerson({ person, docks }: { person: Person; docks: NamedDock[] }) {
  const router = useRouter();
  const toast = useToast();
  const [open, setOpen] = useState(false);
  const { busy, failure, run, forget } = useSend();
  const path = `/api/v1/people/${person.id}`;

  async function carryOut(work: () => Promise<Answer<unknown>>, text: string) {
    if (!(await run(work))) return;
    toast({ text });
    setOpen(false);
    router.refresh();
  }
  async function submit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const name = textOf(event.currentTarget, 'name');
    const { role, dockIds } = readRoleAndDocks(event.currentTarget);
    const work = () => (dockIds ? send('PATCH', path, { name, role, dockIds }) : noDock());
    await carryOut(work, `${name} is changed.`);
  }
  const deactivate = () =>
    carryOut(() => send('POST', `${path}/deactivation`), `${person.name} is deactivated and signed out.`);
  const reactivate = () =>
    carryOut(() => send('DELETE', `${path}/deactivation`), `${person.name} may sign in again.`);

  const error = formError(failure, ['name', 'role', 'dockIds']);
  const close = () => {
    setOpen(false);
    forget();
  };
  return (
    <>
      <Button onClick={() => setOpen(true)} aria-label={`Change ${person.name}`}>
        Change
      </Button>
      <Dialog open={open} onClose={close} title={person.name}>
        {open ? (
          <form onSubmit={(event) => void submit(event)} noValidate className="grid gap-5">
            {error ? <Notice tone="danger">{error}</Notice> : null}
            <p className="break-words text-ink-soft">{person.email}</p>
            <TextInput
              name="name"
              label="Name"
              defaultValue={person.name}
              error={fieldError(failure, 'name')}
            />
            <RoleAndDocks docks={docks} role={person.role} dockIds={person.dockIds} failure={failure} />
            <p className="text-ink-soft">Another role or other docks sign {person.name} out everywhere.</p>
            <div className="flex flex-wrap justify-between gap-3">
              <Button type="submit" kind="primary" busy={busy}>
                Save
              </Button>
              {person.deactivatedAt ? (
                <Button disabled={busy} onClick={() => void reactivate()}>
                  Let sign in again
                </Button>
              ) : (
                <Button kind="danger" disabled={busy} onClick={() => void deactivate()}>
                  Deactivate
                </Button>
              )}
            </div>
          </form>
        ) : null}
      </Dialog>
    </>
  );
}
