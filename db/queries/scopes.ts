import { sql, type Kysely, type Transaction } from 'kysely';
import type { ScopedUnit } from '@/lib/domain/rule';
import type { DB } from '../tables';

/** What of a unit decides which rules are for it. */
export type ScopedUnitRow = ScopedUnit & { id: string };

/** The units of these docks by what rules look at, in order of id; retired ones are left out. */
export async function listScopedUnits(
  db: Kysely<DB>,
  dockIds: 'all' | readonly string[] = 'all',
): Promise<ScopedUnitRow[]> {
  const query = db
    .selectFrom('unit')
    .innerJoin('model', 'model.id', 'unit.model_id')
    .select([
      'unit.id',
      'unit.model_id as modelId',
      'unit.dock_id as dockId',
      'model.propulsion',
      'model.stroke',
      sql<number>`coalesce(unit.carb_count_override, model.carb_count)`.as('carbCount'),
    ])
    .where('unit.retired_at', 'is', null)
    .orderBy('unit.id');
  return (dockIds === 'all' ? query : query.where('unit.dock_id', 'in', [...dockIds])).execute();
}

/**
 * Lets no unit come, move or change until the transaction ends, and waits for those that are being written: so
 * that no unit slips between the list of those a rule is for and the rule. Takes it before any other lock.
 */
export async function lockScopes(trx: Transaction<DB>): Promise<void> {
  await sql`lock table unit in share mode`.execute(trx);
}

/**
 * For a write that changes which rules units come under without touching `unit`: waits for rules that are being
 * written, and makes them wait, as a write to `unit` does. Takes it before any other lock.
 */
export async function lockScopesForChange(trx: Transaction<DB>): Promise<void> {
  await sql`lock table unit in row exclusive mode`.execute(trx);
}
