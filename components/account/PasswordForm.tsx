'use client';

import type { FormEvent } from 'react';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import { TextInput } from '@/components/ui/TextInput';
import { useToast } from '@/components/ui/Toast';
import { fieldError, formError, send } from '@/lib/client/api';
import { rawOf } from '@/lib/client/form-values';
import { useSend } from '@/lib/client/use-send';
import { NewPasswordInput } from './NewPasswordInput';

/** Changes one's own password; this browser stays signed in, all others are signed out. */
export function PasswordForm({ email }: { email: string }) {
  const toast = useToast();
  const { busy, failure, run } = useSend();
  async function submit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const form = event.currentTarget;
    const body = { currentPassword: rawOf(form, 'currentPassword'), newPassword: rawOf(form, 'newPassword') };
    if (!(await run(() => send('PUT', '/api/v1/account/password', body)))) return;
    form.reset();
    toast({ text: 'Your password is changed. Your other devices are signed out.' });
  }
  const error = formError(failure, ['currentPassword', 'newPassword']);
  return (
    <form onSubmit={(event) => void submit(event)} noValidate className="grid max-w-xl gap-5">
      {error ? <Notice tone="danger">{error}</Notice> : null}
      <input type="hidden" name="username" autoComplete="username" value={email} />
      <TextInput
        name="currentPassword"
        type="password"
        label="Present password"
        autoComplete="current-password"
        error={fieldError(failure, 'currentPassword')}
      />
      <NewPasswordInput name="newPassword" label="New password" error={fieldError(failure, 'newPassword')} />
      <div>
        <Button type="submit" kind="primary" busy={busy}>
          Change the password
        </Button>
      </div>
    </form>
  );
}
