import { countDigestMails, lockDigestReader } from '@/db/queries/digests';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { Refusal } from '@/lib/errors';
import { mailboxUrl } from '@/lib/links';
import type { DigestSending } from '@/lib/schemas/digest';
import { composeDigest } from './compose-digest';
import { queueMail } from './queue-mail';
import { requireDigestReader } from './require-digest-reader';

const AT_MOST = 3;
const WITHIN_MS = 10 * 60_000;

/**
 * Sends the digest, as things stand now, to the manager who asks. It does not count as the week's. Throws
 * `forbidden` for anybody else, `too_many_attempts` after three letters within ten minutes.
 */
export async function sendDigestNow(ctx: Context): Promise<DigestSending> {
  const { personId } = requireDigestReader(ctx);
  return runTransaction(ctx.db, async (db) => {
    const reader = await lockDigestReader(db, personId);
    if (!reader) throw new Refusal('forbidden', 'This account is not in use any more.');
    const since = new Date(ctx.now.getTime() - WITHIN_MS);
    if ((await countDigestMails(db, reader.email, since)) >= AT_MOST) {
      throw new Refusal('too_many_attempts', 'Three were sent within ten minutes. Look at those first.');
    }
    const { digest: _digest, ...letter } = await composeDigest({ ...ctx, db }, { reader });
    const mailId = await queueMail({ ...ctx, db }, { kind: 'digest', to: reader.email, ...letter });
    return { mailId, to: reader.email, mailboxUrl: mailboxUrl() };
  });
}
