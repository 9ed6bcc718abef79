import { findDigestReader, insertDigest, insertDigestMail } from '@/db/queries/digests';
import { listDocks } from '@/db/queries/docks';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import type { CalendarDay } from '@/lib/domain/calendar-day';
import { digestWeekToSend } from '@/lib/domain/digest-week';
import { composeDigest } from './compose-digest';
import { queueMail } from './queue-mail';
import { timeZonesOf } from './tick-digests';

/**
 * Sends a manager the digest of a week, once: the week's row is taken first, and the letter is queued in the same
 * transaction. Does nothing when it is there already, is not wanted any more, or comes too late for the week.
 */
export async function sendDigest(
  ctx: Context,
  { personId, weekOn }: { personId: string; weekOn: CalendarDay },
): Promise<void> {
  await runTransaction(ctx.db, async (db) => {
    const reader = await findDigestReader(db, personId);
    if (!reader?.digest_wanted || reader.role !== 'manager') return;
    const zones = timeZonesOf(reader, await listDocks(db, 'all'));
    if (digestWeekToSend(zones, ctx.now) !== weekOn) return;
    const digestId = await insertDigest(db, { personId, weekOn, now: ctx.now });
    if (!digestId) return;
    const { digest: _digest, ...letter } = await composeDigest({ ...ctx, db }, { reader, weekOn });
    const mailId = await queueMail({ ...ctx, db }, { kind: 'digest', to: reader.email, ...letter });
    await insertDigestMail(db, digestId, mailId);
  });
}
