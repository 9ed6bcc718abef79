import { findDigestReader } from '@/db/queries/digests';
import type { Context } from '@/lib/context';
import { Refusal, refuseField } from '@/lib/errors';
import { currentWeek } from '@/lib/domain/digest-week';
import type { DigestPreview, DigestQuery } from '@/lib/schemas/digest';
import { composeDigest } from './compose-digest';
import { requireDigestReader } from './require-digest-reader';

/**
 * The digest as the manager who asks would get it now. `weekOn` looks back on the week before that Monday; what is
 * overdue, held and due is as of now all the same. Throws `forbidden`, and `invalid_input` on a `weekOn` to come.
 */
export async function previewDigest(ctx: Context, { weekOn }: DigestQuery): Promise<DigestPreview> {
  const { personId } = requireDigestReader(ctx);
  const reader = await findDigestReader(ctx.db, personId);
  if (!reader) throw new Refusal('forbidden', 'This account is not in use any more.');
  // The first time zone to begin a week is 14 hours ahead of UTC (Pacific/Kiritimati).
  if (weekOn && weekOn > currentWeek(['Pacific/Kiritimati'], ctx.now)) {
    throw refuseField('weekOn', 'is a week that has not begun');
  }
  const { digest, subject, html, text } = await composeDigest(ctx, { reader, weekOn });
  return { weekOn: digest.weekOn, wanted: reader.digest_wanted, subject, html, text, totals: digest.totals };
}
