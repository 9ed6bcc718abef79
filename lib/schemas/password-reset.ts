import { z } from 'zod';
import { linkToken } from './invitation';
import { email, newPassword } from './person';

export const askPasswordReset = z.strictObject({ email });
export const resetAsked = z.object({ detail: z.string() });
export const resetPassword = z.strictObject({ token: linkToken, password: newPassword });

export type AskPasswordReset = z.output<typeof askPasswordReset>;
export type ResetPassword = z.output<typeof resetPassword>;
