import type { Context } from '@/lib/context';
import { enqueue } from '@/lib/enqueue';
import type { AskPasswordReset } from '@/lib/schemas/password-reset';
import { reserveAttempt } from './reserve-attempt';

/**
 * Has a link for choosing a new password sent, when somebody has this e-mail address. Answers nothing either way,
 * by the same steps and in the same time: the worker looks who it is, so nobody learns who is here. Throws
 * `too_many_attempts` with the time to wait, counted by e-mail address, known or not, and by network address.
 */
export async function askPasswordReset(
  ctx: Context,
  { email, address }: AskPasswordReset & { address: string },
): Promise<void> {
  const account = `new password of ${email.toLowerCase()}`;
  await reserveAttempt(ctx, { account, address, deviceId: null, at: 'reset' });
  await enqueue(ctx.db, 'send-password-reset', { id: crypto.randomUUID(), email });
}
