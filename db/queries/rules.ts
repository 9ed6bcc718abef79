import type { Kysely, Selectable } from 'kysely';
import type { DB, RuleTable } from '../tables';

export type RuleRow = Selectable<RuleTable>;

/** The rules in force, by name. */
export function listRules(db: Kysely<DB>): Promise<RuleRow[]> {
  return db.selectFrom('rule').selectAll().where('ended_at', 'is', null).orderBy('name').execute();
}

export function findRule(db: Kysely<DB>, id: string): Promise<RuleRow | undefined> {
  return db.selectFrom('rule').selectAll().where('id', '=', id).executeTakeFirst();
}
