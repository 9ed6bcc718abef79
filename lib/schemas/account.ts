import { z } from 'zod';
import { line } from './common';
import { givenPassword, newPassword, person } from './person';

/** Only what is named changes. */
export const changeAccount = z
  .strictObject({ name: line(80), digestWanted: z.boolean('is true or false') })
  .partial()
  .refine((input) => Object.keys(input).length > 0, 'names nothing to change');

export const changePassword = z.strictObject({ currentPassword: givenPassword, newPassword });

export const account = person.omit({ deactivatedAt: true });

export type ChangeAccount = z.output<typeof changeAccount>;
export type ChangePassword = z.output<typeof changePassword>;
export type Account = z.output<typeof account>;
