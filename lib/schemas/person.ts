import { z } from 'zod';
import { PASSWORD_MAX_LENGTH, PASSWORD_MIN_LENGTH } from '@/lib/domain/password-rule';
import { id, line } from './common';

export const role = z.enum(['manager', 'mechanic', 'dock'], 'is manager, mechanic or dock');

/** An e-mail address, in lower case: nobody has two that differ in case alone. */
export const email = z
  .string('give an e-mail address')
  .trim()
  .toLowerCase()
  .max(254, 'is longer than 254 characters')
  .pipe(z.email('is not an e-mail address'));

/** A password being chosen. `lib/domain/password-rule.ts` has the rest of the rule, which needs the e-mail. */
export const newPassword = z
  .string('give a password')
  .min(PASSWORD_MIN_LENGTH, `needs at least ${PASSWORD_MIN_LENGTH} characters`)
  .max(PASSWORD_MAX_LENGTH, `is longer than ${PASSWORD_MAX_LENGTH} characters`);

/** A password being given to be compared. */
export const givenPassword = z
  .string('give a password')
  .min(1, 'is empty')
  .max(PASSWORD_MAX_LENGTH, `is longer than ${PASSWORD_MAX_LENGTH} characters`);

/** The docks somebody works at. Empty: every dock. */
export const dockIds = z.array(id, 'give a list of docks').max(200, 'are more than 200 docks');

export const createPerson = z.strictObject({
  name: line(80),
  email,
  role,
  dockIds: dockIds.optional(),
  password: newPassword,
});

/** Only what is named changes. */
export const changePerson = z
  .strictObject({ name: line(80), role, dockIds })
  .partial()
  .refine((input) => Object.keys(input).length > 0, 'names nothing to change');

export const person = z.object({
  id,
  name: z.string(),
  email: z.string(),
  role,
  dockIds: z.array(id),
  digestWanted: z.boolean(),
  deactivatedAt: z.string().nullable(),
});

export type CreatePerson = z.output<typeof createPerson>;
export type ChangePerson = z.output<typeof changePerson>;
export type Person = z.output<typeof person>;
