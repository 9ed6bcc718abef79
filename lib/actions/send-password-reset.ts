import {
  countPasswordResets,
  findPasswordResetById,
  insertPasswordReset,
} from '@/db/queries/password-resets';
import { findCredentialByEmail, lockPerson } from '@/db/queries/people';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { linkTo } from '@/lib/links';
import { makeToken } from '@/lib/secrets/one-time-token';
import { queueMail } from './queue-mail';
import { instantInWords, writeLetter } from './write-letter';

const HOUR_MS = 3_600_000;
/** Letters a person is sent within an hour, however often somebody asks. */
const LETTERS_AN_HOUR = 3;

/**
 * Sends a link for choosing a new password, good for one hour and one use, to the person who has this e-mail
 * address; to nobody when there is none or they are deactivated. `id` is the asking's: it is answered once.
 */
export async function sendPasswordReset(
  ctx: Context,
  { id, email }: { id: string; email: string },
): Promise<void> {
  const person = await findCredentialByEmail(ctx.db, email);
  if (!person || person.deactivated_at) return;
  const { token, hash } = makeToken();
  const since = new Date(ctx.now.getTime() - HOUR_MS);
  const expiresAt = new Date(ctx.now.getTime() + HOUR_MS);
  await runTransaction(ctx.db, async (trx) => {
    await lockPerson(trx, person.id);
    if (await findPasswordResetById(trx, id)) return;
    if ((await countPasswordResets(trx, person.id, since)) >= LETTERS_AN_HOUR) return;
    await insertPasswordReset(trx, { id, personId: person.id, tokenHash: hash, now: ctx.now, expiresAt });
    const letter = writeLetter({
      kind: 'password-reset',
      to: person.email,
      subject: 'Choose a new password for Wakewright',
      before: ['Somebody asked for a new password for this e-mail address.'],
      link: { label: 'Choose a new password', href: linkTo(`/reset/${token}`) },
      after: [
        `The link works once, until ${instantInWords(expiresAt)}. It ends every session of yours.`,
        'If it was not you, do nothing: your password stays as it is.',
      ],
    });
    await queueMail({ ...ctx, db: trx }, letter);
  });
}
