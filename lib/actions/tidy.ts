import { deleteOldRecords } from '@/db/queries/tidy';
import type { Context } from '@/lib/context';

/** How long what only the system needs is kept: tries to sign in, ended sessions, letters, workers, failed jobs. */
const KEPT_MS = 30 * 86_400_000;

/** Takes away what has been over for 30 days. Nothing that anybody did on a unit is ever among it. */
export async function tidy(ctx: Context): Promise<void> {
  await deleteOldRecords(ctx.db, new Date(ctx.now.getTime() - KEPT_MS));
}
