import type { Context } from '@/lib/context';
import { linkTo } from '@/lib/links';
import { queueMail } from './queue-mail';
import { instantInWords, writeLetter } from './write-letter';

/** Queues the letter that tells a person their password was changed, in the caller's transaction. */
export async function tellPasswordChanged(ctx: Pick<Context, 'db' | 'now'>, to: string): Promise<void> {
  const letter = writeLetter({
    kind: 'password-changed',
    to,
    subject: 'Your Wakewright password was changed',
    before: [`Your password was changed on ${instantInWords(ctx.now)}.`],
    link: { label: 'If it was not you, choose a new one at once', href: linkTo('/forgot') },
    after: ['If it was you, there is nothing to do.'],
  });
  await queueMail(ctx, letter);
}
