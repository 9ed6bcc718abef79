import { z } from 'zod';
import { Refusal } from '@/lib/errors';
import { email, givenPassword } from '@/lib/schemas/person';

const credentials = z.object({ email, password: givenPassword });

/** What somebody who signs in has sent. Throws `invalid_input` with each field that is wrong. */
export function parseCredentials(given: unknown): z.output<typeof credentials> {
  const parsed = credentials.safeParse(given);
  if (parsed.success) return parsed.data;
  const errors = parsed.error.issues.map(({ path, message }) => ({ path: path.join('.'), message }));
  throw new Refusal('invalid_input', 'Give an e-mail address and a password.', errors);
}
