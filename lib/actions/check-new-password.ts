import { checkPassword } from '@/lib/domain/password-rule';
import { refuseField } from '@/lib/errors';

/** Throws `invalid_input` on `path` unless this e-mail's owner may have the password. */
export function checkNewPassword(password: string, email: string, path = 'password'): void {
  const wrong = checkPassword(password, email);
  if (wrong) throw refuseField(path, wrong);
}
