import { replaceDigestWanted } from '@/db/queries/digests';
import type { Context } from '@/lib/context';
import type { DigestSubscription } from '@/lib/schemas/digest';
import { requireDigestReader } from './require-digest-reader';

/** Says whether the manager who asks gets the digest on Mondays. Throws `forbidden` for anybody else. */
export async function setDigestWanted(
  ctx: Context,
  { wanted }: DigestSubscription,
): Promise<DigestSubscription> {
  await replaceDigestWanted(ctx.db, requireDigestReader(ctx).personId, wanted);
  return { wanted };
}
