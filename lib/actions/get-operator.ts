import { findOperator } from '@/db/queries/operator';
import type { Context } from '@/lib/context';

/** The operator's name, or null on a server that nobody has set up yet. */
export async function getOperator(ctx: Pick<Context, 'db'>): Promise<{ name: string } | null> {
  return (await findOperator(ctx.db)) ?? null;
}
