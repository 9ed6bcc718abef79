import {
  sql,
  type Insertable,
  type Kysely,
  type Selectable,
  type Transaction,
  type Updateable,
} from 'kysely';
import type { DB, RuleTable } from '../tables';
import { hasReached, localDayAt } from './due-state';

export type RuleRow = Selectable<RuleTable>;
/** A rule with the names of who changed and who ended it. */
export type NamedRuleRow = RuleRow & { changed_by_name: string | null; ended_by_name: string | null };

/** The rules in force, by name. */
export function listRules(db: Kysely<DB>): Promise<RuleRow[]> {
  return db.selectFrom('rule').selectAll().where('ended_at', 'is', null).orderBy('name').execute();
}

function selectNamedRules(db: Kysely<DB>) {
  return db
    .selectFrom('rule')
    .leftJoin('person as changer', 'changer.id', 'rule.changed_by')
    .leftJoin('person as ender', 'ender.id', 'rule.ended_by')
    .selectAll('rule')
    .select(['changer.name as changed_by_name', 'ender.name as ended_by_name']);
}

/** The rules by name, those in force first; ended ones only when asked for. */
export function listNamedRules(db: Kysely<DB>, { ended }: { ended: boolean }): Promise<NamedRuleRow[]> {
  const query = selectNamedRules(db)
    .orderBy(sql`rule.ended_at is not null`)
    .orderBy('rule.name');
  return (ended ? query : query.where('rule.ended_at', 'is', null)).execute();
}

/** The rule of this id, ended or in force. */
export function findRule(db: Kysely<DB>, id: string): Promise<NamedRuleRow | undefined> {
  return selectNamedRules(db).where('rule.id', '=', id).executeTakeFirst();
}

/** Locks the rule against every other writer of it until the transaction ends. */
export async function lockRule(trx: Transaction<DB>, id: string): Promise<void> {
  await trx.selectFrom('rule').select('id').where('id', '=', id).forUpdate().execute();
}

/** What of a rule its due points follow from, as JSON text. */
type Duties = { scope: string; triggers: string; lead: string; tolerance: string };

/** Whether the rule stands for the same duties already, so that a write moves no due point. */
export async function hasDuties(db: Kysely<DB>, id: string, duties: Duties): Promise<boolean> {
  const { rows } = await sql`
    select 1 from rule
     where id = ${id} and scope = ${duties.scope}::jsonb and triggers = ${duties.triggers}::jsonb
       and lead = ${duties.lead}::jsonb and tolerance = ${duties.tolerance}::jsonb`.execute(db);
  return rows.length > 0;
}

/** Stores a rule in force; answers its id. The index `rule_name` keeps names of those apart, in any case. */
export function insertRule(db: Kysely<DB>, row: Insertable<RuleTable>): Promise<{ id: string }> {
  return db.insertInto('rule').values(row).returning('id').executeTakeFirstOrThrow();
}

/** Writes these columns of the rule and counts the write. */
export async function replaceRule(db: Kysely<DB>, id: string, row: Updateable<RuleTable>): Promise<void> {
  await db
    .updateTable('rule')
    .set((eb) => ({ ...row, revision: eb('revision', '+', 1) }))
    .where('id', '=', id)
    .execute();
}

/** How many units are overdue, due and upcoming under a rule. */
export type RuleStatesRow = { rule_id: string; overdue: number; due: number; upcoming: number };

/** The worst state of each unit under each rule, counted by rule; only units of these docks. */
export async function listRuleStates(
  db: Kysely<DB>,
  dockIds: 'all' | readonly string[],
  now: Date,
): Promise<RuleStatesRow[]> {
  const atDocks = dockIds === 'all' ? sql`true` : sql`u.dock_id = any(${[...dockIds]}::uuid[])`;
  const at = { meter: 'm', today: localDayAt(now) };
  const { rows } = await sql<RuleStatesRow>`
    select rule_id,
           count(*) filter (where worst = 3)::int as overdue,
           count(*) filter (where worst = 2)::int as due,
           count(*) filter (where worst = 1)::int as upcoming
      from (
        select p.rule_id, p.unit_id, max(case
            when ${hasReached('overdue_from', at)} then 3
            when ${hasReached('due', at)} then 2
            when ${hasReached('upcoming_from', at)} then 1
            else 0 end) as worst
          from due_point p
          join unit u on u.id = p.unit_id and u.retired_at is null
          join dock d on d.id = u.dock_id
          join live_meter m on m.unit_id = u.id
         where ${atDocks}
         group by p.rule_id, p.unit_id
      ) by_unit
     group by rule_id`.execute(db);
  return rows;
}
