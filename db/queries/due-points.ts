import { sql, type Kysely, type Transaction } from 'kysely';
import type { DuePoint } from '@/lib/domain/due';
import { toDuePoint } from '@/lib/domain/duty-standing';
import type { DB } from '../tables';
import { pointsHash } from './due-look';

/** A due point to be stored: of a unit, under a rule, by the index of the rule's trigger. */
export type DuePointToStore = { unitId: string; ruleId: string; triggerIndex: number; point: DuePoint };

/**
 * Makes the stored due points of these units exactly `points`. Rows that are right already are not written.
 * Answers how many rows were written or taken away.
 */
export async function replaceDuePoints(
  trx: Transaction<DB>,
  unitIds: readonly string[],
  points: readonly DuePointToStore[],
): Promise<number> {
  const columns = toColumns(points);
  const { rows } = await sql<{ changed: number }>`
    with wanted as (
      select * from unnest(
        ${columns.unitIds}::uuid[], ${columns.ruleIds}::uuid[], ${columns.indexes}::smallint[],
        ${columns.dueTenths}::int[], ${columns.upcomingTenths}::int[], ${columns.overdueTenths}::int[],
        ${columns.dueOutings}::int[], ${columns.upcomingOutings}::int[], ${columns.overdueOutings}::int[],
        ${columns.dueOn}::date[], ${columns.upcomingOn}::date[], ${columns.overdueOn}::date[]
      ) as w(unit_id, rule_id, trigger_index,
        due_tenths, upcoming_from_tenths, overdue_from_tenths,
        due_outings, upcoming_from_outings, overdue_from_outings,
        due_on, upcoming_from_on, overdue_from_on)
    ), gone as (
      delete from due_point p
       where p.unit_id = any(${[...unitIds]}::uuid[])
         and not exists (select 1 from wanted w
           where w.unit_id = p.unit_id and w.rule_id = p.rule_id and w.trigger_index = p.trigger_index)
      returning 1
    ), news as (
      select w.* from wanted w
        left join due_point p using (unit_id, rule_id, trigger_index)
       where p.unit_id is null
          or (w.due_tenths, w.upcoming_from_tenths, w.overdue_from_tenths,
              w.due_outings, w.upcoming_from_outings, w.overdue_from_outings,
              w.due_on, w.upcoming_from_on, w.overdue_from_on)
             is distinct from
             (p.due_tenths, p.upcoming_from_tenths, p.overdue_from_tenths,
              p.due_outings, p.upcoming_from_outings, p.overdue_from_outings,
              p.due_on, p.upcoming_from_on, p.overdue_from_on)
    ), put as (
      insert into due_point select * from news
      on conflict (unit_id, rule_id, trigger_index) do update set
        due_tenths = excluded.due_tenths, upcoming_from_tenths = excluded.upcoming_from_tenths,
        overdue_from_tenths = excluded.overdue_from_tenths,
        due_outings = excluded.due_outings, upcoming_from_outings = excluded.upcoming_from_outings,
        overdue_from_outings = excluded.overdue_from_outings,
        due_on = excluded.due_on, upcoming_from_on = excluded.upcoming_from_on,
        overdue_from_on = excluded.overdue_from_on
      returning 1
    )
    select ((select count(*) from gone) + (select count(*) from put))::int as changed`.execute(trx);
  return rows[0]?.changed ?? 0;
}

/** One array a column, in the order of the points: what `unnest` takes. */
function toColumns(points: readonly DuePointToStore[]) {
  const hours = points.map(({ point }) => (point.on === 'engine_hours' ? point : null));
  const outings = points.map(({ point }) => (point.on === 'outings' ? point : null));
  const days = points.map(({ point }) => (point.on === 'calendar' ? point : null));
  return {
    unitIds: points.map((p) => p.unitId),
    ruleIds: points.map((p) => p.ruleId),
    indexes: points.map((p) => p.triggerIndex),
    dueTenths: hours.map((p) => p?.dueTenths ?? null),
    upcomingTenths: hours.map((p) => p?.upcomingFromTenths ?? null),
    overdueTenths: hours.map((p) => p?.overdueFromTenths ?? null),
    dueOutings: outings.map((p) => p?.dueOutings ?? null),
    upcomingOutings: outings.map((p) => p?.upcomingFromOutings ?? null),
    overdueOutings: outings.map((p) => p?.overdueFromOutings ?? null),
    dueOn: days.map((p) => p?.dueOn ?? null),
    upcomingOn: days.map((p) => p?.upcomingFromOn ?? null),
    overdueOn: days.map((p) => p?.overdueFromOn ?? null),
  };
}

/**
 * Locks the assessments of these units, in order of id, so that no two refreshes of one unit interleave.
 * Answers the revision each is wanted at.
 */
export async function lockAssessments(trx: Transaction<DB>, unitIds: readonly string[]) {
  return trx
    .selectFrom('assessment')
    .select(['unit_id', 'wanted_revision', 'assessed_revision'])
    .where('unit_id', '=', sql<string>`any(${[...unitIds]}::uuid[])`)
    .orderBy('unit_id')
    .forUpdate()
    .execute();
}

/**
 * Records that the stored due points of these units, whose assessments are locked, are those of the facts with these
 * fingerprints. Rows that say so already stay.
 */
export async function replaceAssessments(
  trx: Transaction<DB>,
  looked: readonly { id: string; factsHash: string }[],
  now: Date,
): Promise<void> {
  await sql`
    update assessment a
       set assessed_revision = a.wanted_revision, assessed_at = ${now}, facts_hash = u.facts_hash,
           points_hash = u.points_hash
      from (select u.id, u.facts_hash, ${pointsHash} as points_hash
              from unnest(${looked.map((unit) => unit.id)}::uuid[], ${looked.map((unit) => unit.factsHash)}::bigint[])
                as u(id, facts_hash)) u
     where a.unit_id = u.id
       and (a.assessed_revision < a.wanted_revision or a.facts_hash is distinct from u.facts_hash
         or a.points_hash is distinct from u.points_hash)`.execute(trx);
}

/**
 * Says that these units must be assessed anew before they may be hired out: for every write that can bring a due
 * point nearer. Until the worker has done it they are held as not yet assessed.
 */
export async function wantAssessments(trx: Kysely<DB>, unitIds: readonly string[]): Promise<void> {
  await sql`
    insert into assessment (unit_id) select id from unnest(${[...unitIds]}::uuid[]) as u(id) order by id
    on conflict (unit_id) do update set wanted_revision = assessment.wanted_revision + 1`.execute(trx);
}

/** A stored due point as the domain has it. */
export type StoredDuePoint = { ruleId: string; triggerIndex: number; point: DuePoint };

/** The stored due points of a unit, under rules in force and ended ones alike. */
export async function listDuePoints(db: Kysely<DB>, unitId: string): Promise<StoredDuePoint[]> {
  const rows = await db.selectFrom('due_point').selectAll().where('unit_id', '=', unitId).execute();
  return rows.map((row) => ({
    ruleId: row.rule_id,
    triggerIndex: row.trigger_index,
    point: toDuePoint(row),
  }));
}

/** Whether a unit's due points are those of its facts as they are now. */
export async function isAssessed(db: Kysely<DB>, unitId: string): Promise<boolean> {
  const row = await db
    .selectFrom('assessment')
    .select(['wanted_revision', 'assessed_revision'])
    .where('unit_id', '=', unitId)
    .executeTakeFirst();
  return row !== undefined && row.assessed_revision >= row.wanted_revision;
}

/** The latest closing of each rule on a unit. */
export function listLastClosings(db: Kysely<DB>, unitId: string) {
  return db
    .selectFrom('closing')
    .distinctOn('rule_id')
    .select(['rule_id', 'closed_on', 'engine_hours_tenths', 'outings'])
    .where('unit_id', '=', unitId)
    .orderBy('rule_id')
    .orderBy('closed_at', 'desc')
    .orderBy('id', 'desc')
    .execute();
}

/** The closings of one rule on a unit, in the order its due points are computed from. */
export function listClosingsOf(db: Kysely<DB>, unitId: string, ruleId: string) {
  return db
    .selectFrom('closing')
    .select(['closed_on', 'engine_hours_tenths', 'outings'])
    .where('unit_id', '=', unitId)
    .where('rule_id', '=', ruleId)
    .orderBy('closed_at')
    .orderBy('id')
    .execute();
}
