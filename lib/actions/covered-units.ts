import type { Kysely } from 'kysely';
import { listScopedUnits } from '@/db/queries/scopes';
import type { DB } from '@/db/tables';
import { ruleApplies, type Scope } from '@/lib/domain/rule';

/** The ids of the units of the fleet that any of these scopes fits, in order. */
export async function listCoveredUnits(db: Kysely<DB>, scopes: readonly Scope[]): Promise<string[]> {
  const units = await listScopedUnits(db);
  return units.filter((unit) => scopes.some((scope) => ruleApplies(scope, unit))).map(({ id }) => id);
}
