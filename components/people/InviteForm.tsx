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
import { readRoleAndDocks, RoleAndDocks } from './RoleAndDocks';
import type { NamedDock } from './words';

/** The button that opens the invitation, and the invitation. */
export function InviteButton({ docks }: { docks: NamedDock[] }) {
  const [open, setOpen] = useState(false);
  return (
    <>
      <Button kind="primary" onClick={() => setOpen(true)}>
        Invite somebody
      </Button>
      <Dialog open={open} onClose={() => setOpen(false)} title="Invite somebody">
        {open ? <InviteForm docks={docks} onDone={() => setOpen(false)} /> : null}
      </Dialog>
    </>
  );
}

function InviteForm({ docks, onDone }: { docks: NamedDock[]; onDone: () => void }) {
  const router = useRouter();
  const toast = useToast();
  const { busy, failure, run } = useSend();
  async function submit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const form = event.currentTarget;
    const [name, email] = [textOf(form, 'name'), textOf(form, 'email')];
    const { role, dockIds } = readRoleAndDocks(form);
    const body = { name, email, role, dockIds };
    if (!(await run(() => (dockIds ? send('POST', '/api/v1/invitations', body) : noDock())))) return;
    toast({ text: `The invitation to ${email} is on its way.` });
    onDone();
    router.refresh();
  }
  const error = formError(failure, ['name', 'email', 'role', 'dockIds']);
  return (
    <form onSubmit={(event) => void submit(event)} noValidate className="grid gap-5">
      {error ? <Notice tone="danger">{error}</Notice> : null}
      <TextInput name="name" label="Name" autoComplete="off" error={fieldError(failure, 'name')} />
      <TextInput
        name="email"
        type="email"
        label="E-mail address"
        hint="They get a link for choosing a password. It works for seven days."
        autoComplete="off"
        error={fieldError(failure, 'email')}
      />
      <RoleAndDocks docks={docks} role="dock" dockIds={[]} failure={failure} />
      <Button type="submit" kind="primary" busy={busy}>
        Send the invitation
      </Button>
    </form>
  );
}

/** "Some docks" without a dock would mean all of them to the API, so it is not sent. */
export async function noDock(): Promise<Answer<never>> {
  const message = 'Name at least one dock, or choose all docks.';
  return { ok: false, code: 'invalid_input', detail: message, errors: [{ path: 'dockIds', message }] };
}
