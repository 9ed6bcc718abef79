import { TextInput } from '@/components/ui/TextInput';
import { PASSWORD_MIN_LENGTH } from '@/lib/domain/password-rule';

/** A password being chosen, with what is asked of it. */
export function NewPasswordInput({
  name = 'password',
  label = 'Password',
  error,
}: {
  name?: string;
  label?: string;
  error: string | undefined;
}) {
  return (
    <TextInput
      name={name}
      type="password"
      label={label}
      hint={`At least ${PASSWORD_MIN_LENGTH} characters. A few words in a row are good; no signs or capitals are asked for.`}
      autoComplete="new-password"
      error={error}
      large
    />
  );
}
