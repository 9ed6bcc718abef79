'use client';

import { TextInput } from '@/components/ui/TextInput';
import { useToast } from '@/components/ui/Toast';
import { fieldError, send } from '@/lib/client/api';
import { rawOf } from '@/lib/client/form-values';
import { useSend } from '@/lib/client/use-send';
import { AccountForm } from './AccountForm';
import { NewPasswordInput } from './NewPasswordInput';

/** Changes one's own password; this browser stays signed in, all others are signed out. */
export function PasswordForm({ email }: { email: string }) {
  const toast = useToast();
  const sending = useSend();
  const { failure, run } = sending;
  async function submit(form: HTMLFormElement) {
    const body = { currentPassword: rawOf(form, 'currentPassword'), newPassword: rawOf(form, 'newPassword') };
    if (!(await run(() => send('PUT', '/api/v1/account/password', body)))) return;
    form.reset();
    toast({ text: 'Your password is changed. Your other devices are signed out.' });
  }
  return (
    <AccountForm
      fields={['currentPassword', 'newPassword']}
      button="Change the password"
      sending={sending}
      onSubmit={submit}
    >
      <input type="hidden" name="username" autoComplete="username" value={email} />
      <TextInput
        name="currentPassword"
        type="password"
        label="Present password"
        autoComplete="current-password"
        error={fieldError(failure, 'currentPassword')}
      />
      <NewPasswordInput name="newPassword" label="New password" error={fieldError(failure, 'newPassword')} />
    </AccountForm>
  );
}
