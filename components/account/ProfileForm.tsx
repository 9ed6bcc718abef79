'use client';

import { useRouter } from 'next/navigation';
import { Checkbox } from '@/components/ui/Checkbox';
import { TextInput } from '@/components/ui/TextInput';
import { useToast } from '@/components/ui/Toast';
import { fieldError, send } from '@/lib/client/api';
import { textOf } from '@/lib/client/form-values';
import { useSend } from '@/lib/client/use-send';
import type { Account } from '@/lib/schemas/account';
import { AccountForm } from './AccountForm';

/** One's own name and, for a manager, whether the digest comes by e-mail. */
export function ProfileForm({ account }: { account: Account }) {
  const router = useRouter();
  const toast = useToast();
  const sending = useSend();
  const { failure, run } = sending;
  const isManager = account.role === 'manager';
  async function submit(form: HTMLFormElement) {
    const digestWanted = textOf(form, 'digestWanted') === 'on';
    const body = { name: textOf(form, 'name'), ...(isManager && { digestWanted }) };
    if (!(await run(() => send('PATCH', '/api/v1/account', body)))) return;
    toast({ text: 'Saved.' });
    router.refresh();
  }
  return (
    <AccountForm fields={['name', 'digestWanted']} button="Save" sending={sending} onSubmit={submit}>
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
    </AccountForm>
  );
}
