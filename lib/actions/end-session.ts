import { endSession as endSessionRow } from '@/db/queries/sessions';
import type { Context } from '@/lib/context';

/** Ends the session of this id, as when somebody signs out. One that has ended already stays as it is. */
export async function endSession(ctx: Context, { sessionId }: { sessionId: string }): Promise<void> {
  await endSessionRow(ctx.db, sessionId, ctx.now);
}
