import { sql, type Insertable, type Kysely, type Transaction } from 'kysely';
import type { CalendarDay } from '@/lib/domain/calendar-day';
import type { ClosureTable, DB } from '../tables';

/** A closure with whom it names and the dock its unit is at. */
export type ClosureRow = NonNullable<Awaited<ReturnType<typeof findClosure>>>;

function selectClosures(db: Kysely<DB>) {
  return db
    .selectFrom('closure')
    .innerJoin('unit', 'unit.id', 'closure.unit_id')
    .leftJoin('person as closer', 'closer.id', 'closure.closed_by')
    .leftJoin('person as reverser', 'reverser.id', 'closure.reversed_by')
    .selectAll('closure')
    .select(['unit.dock_id', 'closer.name as closer_name', 'reverser.name as reverser_name']);
}

/** The closure of this id, reversed or not. */
export function findClosure(db: Kysely<DB>, id: string) {
  return selectClosures(db).where('closure.id', '=', id).executeTakeFirst();
}

/** The closure of this id, reversed or not. Throws when there is none. */
export function getClosure(db: Kysely<DB>, id: string) {
  return selectClosures(db).where('closure.id', '=', id).executeTakeFirstOrThrow();
}

/** The closures of a task and, where it has a rule, of that rule on the unit: the latest first, reversed ones too. */
export function listClosures(db: Kysely<DB>, task: { id: string; unit_id: string; rule_id: string | null }) {
  return selectClosures(db)
    .where('closure.unit_id', '=', task.unit_id)
    .where((eb) =>
      task.rule_id
        ? eb.or([eb('closure.task_id', '=', task.id), eb('closure.rule_id', '=', task.rule_id)])
        : eb('closure.task_id', '=', task.id),
    )
    .orderBy('closure.closed_at', 'desc')
    .orderBy('closure.recorded_at', 'desc')
    .limit(50)
    .execute();
}

/**
 * Stores that a task was done; answers its id. The index `closure_task` keeps one that is not reversed a task.
 */
export function insertClosure(trx: Transaction<DB>, row: Insertable<ClosureTable>): Promise<{ id: string }> {
  return trx.insertInto('closure').values(row).returning('id').executeTakeFirstOrThrow();
}

/** Locks a closure against every other writer of it. */
export function lockClosure(trx: Transaction<DB>, id: string) {
  return trx.selectFrom('closure').selectAll().where('id', '=', id).forUpdate().executeTakeFirstOrThrow();
}

/** Marks a closure reversed, with why. Lock it first: this does not look whether it is already. */
export async function reverseClosureRow(
  trx: Transaction<DB>,
  id: string,
  set: { reversed_at: Date; reversed_by: string | null; reverse_reason: string },
): Promise<void> {
  await trx.updateTable('closure').set(set).where('id', '=', id).execute();
}

/** When a rule was last done on a unit, by closure or baseline. */
export function findLastClosing(
  db: Kysely<DB>,
  unitId: string,
  ruleId: string,
): Promise<{ closed_on: CalendarDay; closed_at: Date; engine_hours_tenths: number } | undefined> {
  return db
    .selectFrom('closing')
    .select(['closed_on', 'closed_at', 'engine_hours_tenths'])
    .where('unit_id', '=', unitId)
    .where('rule_id', '=', ruleId)
    .orderBy('closed_at', 'desc')
    .orderBy('id', 'desc')
    .limit(1)
    .executeTakeFirst();
}

/** Since when the unit has been held by this rule or this defect, as things stood at an instant; null when it is not. */
export async function findHeldSince(
  db: Kysely<DB>,
  task: { unit_id: string; rule_id: string | null; defect_id: string | null },
  at: Date,
): Promise<Date | null> {
  const { rows } = await sql<{ since: Date | null }>`
    select min(h.since) as since from unit_hold(${at}::timestamptz, null) h
     where h.unit_id = ${task.unit_id}
       and (h.rule_id = ${task.rule_id}::uuid or h.defect_id = ${task.defect_id}::uuid)`.execute(db);
  return rows[0]?.since ?? null;
}
