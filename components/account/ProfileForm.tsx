'use client';

import { useRouter } from 'next/navigation';
import type { FormEvent } from 'react';
import { Button } from '@/components/ui/Button';
import { Checkbox } from '@/components/ui/Checkbox';
import { Notice } from '@/components/ui/Notice';
import { TextInput } from '@/components/ui/TextInput';
import { useToast } from '@/components/ui/Toast';
import { fieldError, formError, send } from '@/lib/client/api';
import { textOf } from '@/lib/client/form-values';
import { useSend } from '@/lib/client/use-send';
import type { Account } from '@/lib/schemas/account';

/** One's own name and, for a manager, whether the digest comes by e-mail. */
export function ProfileForm({ account }: { account: Account }) {
  const router = useRouter();
  const toast = useToast();
  const { busy, failure, run } = useSend();
  const isManager = account.role === 'manager';
  async function submit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const form = event.currentTarget;
    const digestWanted = textOf(form, 'digestWanted') === 'on';
    const body = { name: textOf(form, 'name'), ...(isManager && { digestWanted }) };
    if (!(await run(() => send('PATCH', '/api/v1/account', body)))) return;
    toast({ text: 'Saved.' });
    router.refresh();
  }
  const error = formError(failure, ['name', 'digestWanted']);
  return (
    <form onSubmit={(event) => void submit(event)} noValidate className="grid max-w-xl gap-5">
      {error ? <Notice tone="danger">{error}</Notice> : null}
      <TextInput
        name="name"
        label="Name"
        autoComplete="name"
        defaultValue={account.name}
        error={fieldError(failure, 'name')}
      />
      {isManager ? (
        <Checkbox
          name="digestWanted"
          label="Send me the weekly digest"
          hint={`Monday morning, to ${account.email}.`}
          defaultChecked={account.digestWanted}
          error={fieldError(failure, 'digestWanted')}
        />
      ) : null}
      <div>
        <Button type="submit" kind="primary" busy={busy}>
          Save
        </Button>
      </div>
    </form>
  );
}
