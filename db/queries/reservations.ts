import { sql, type Insertable, type Kysely, type Transaction } from 'kysely';
import type { PartNeed } from '@/lib/domain/rule';
import type { DB, ReservationTable, TaskNeedTable } from '../tables';
import type { Spot } from './stock';

/** What a task's needs are computed from, beside the rules of `listNeedSources`. */
export type TaskNeedsRow = {
  unit_id: string;
  dock_id: string;
  ended_at: Date | null;
  only_per: 'engine' | 'cylinder' | 'carb' | null;
  only_place: number | null;
  engines: number;
  cylinders: number;
  carb_count: number;
  said: { partId: string; quantity: number }[];
};

/** A task as its needs are computed from it. Throws when there is none. */
export async function getTaskNeeds(db: Kysely<DB>, taskId: string): Promise<TaskNeedsRow> {
  const { rows } = await sql<TaskNeedsRow>`
    select t.unit_id, u.dock_id, t.ended_at, t.only_per, t.only_place, m.engines, m.cylinders,
           coalesce(u.carb_count_override, m.carb_count) as carb_count,
           (select coalesce(json_agg(json_build_object('partId', n.part_id, 'quantity', n.quantity)
                                     order by n.said_at, n.part_id), '[]')
              from task_need n where n.task_id = t.id) as said
      from task t
      join unit u on u.id = t.unit_id
      join model m on m.id = u.model_id
     where t.id = ${taskId}`.execute(db);
  if (!rows[0]) throw new Error(`There is no task ${taskId}.`);
  return rows[0];
}

/**
 * The rules whose parts a task may take, the one that counts first: its own; for a follow-up of a failed step those
 * in force with the follow-up's procedure, then the rule of the task that the step belongs to.
 */
export async function listNeedSources(db: Kysely<DB>, taskId: string) {
  const { rows } = await sql<{ scope: DB['rule']['scope']['__select__']; parts: PartNeed[]; own: boolean }>`
    select r.scope, r.parts, r.id = t.rule_id as own
      from task t
      left join procedure_version v on v.id = t.procedure_version_id
      left join step_entry e on e.id = t.step_entry_id
      left join task origin on origin.id = e.task_id
      join rule r on r.id = t.rule_id
        or (t.rule_id is null and t.step_entry_id is not null
            and (r.id = origin.rule_id or (r.procedure_id = v.procedure_id and r.ended_at is null)))
     where t.id = ${taskId}
     order by r.id = t.rule_id desc, r.id = origin.rule_id, r.name, r.id`.execute(db);
  return rows;
}

/** Says how many of a part a task needs; the last word stands. */
export async function replaceTaskNeed(trx: Transaction<DB>, row: Insertable<TaskNeedTable>): Promise<void> {
  await trx
    .insertInto('task_need')
    .values(row)
    .onConflict((conflict) =>
      conflict.columns(['task_id', 'part_id']).doUpdateSet((eb) => ({
        quantity: eb.ref('excluded.quantity'),
        said_at: eb.ref('excluded.said_at'),
        said_by: eb.ref('excluded.said_by'),
      })),
    )
    .execute();
}

/** What a task has reserved and not released. */
export function listReservations(db: Kysely<DB>, taskId: string) {
  return db
    .selectFrom('reservation')
    .selectAll()
    .where('task_id', '=', taskId)
    .where('released_at', 'is', null)
    .orderBy('part_id')
    .orderBy('dock_id')
    .execute();
}

/** Sets parts aside for a task. Lock their shelves and release what it has of the same first. */
export async function insertReservations(
  trx: Transaction<DB>,
  rows: readonly Insertable<ReservationTable>[],
): Promise<void> {
  if (rows.length > 0)
    await trx
      .insertInto('reservation')
      .values([...rows])
      .execute();
}

/** Releases what a task has reserved, all of it unless one shelf is named. */
export async function releaseReservations(
  trx: Transaction<DB>,
  of: { taskId: string; spot?: Spot; at: Date; by: string | null },
): Promise<void> {
  let query = trx
    .updateTable('reservation')
    .set({ released_at: of.at, released_by: of.by })
    .where('task_id', '=', of.taskId)
    .where('released_at', 'is', null);
  if (of.spot) query = query.where('part_id', '=', of.spot.partId).where('dock_id', '=', of.spot.dockId);
  await query.execute();
}

/** For which open tasks a part is set aside. */
export function listReservedFor(db: Kysely<DB>, partId: string, dockIds: 'all' | readonly string[]) {
  let query = db
    .selectFrom('reservation as r')
    .innerJoin('task as t', 't.id', 'r.task_id')
    .innerJoin('unit as u', 'u.id', 't.unit_id')
    .innerJoin('dock as d', 'd.id', 'r.dock_id')
    .where('r.part_id', '=', partId)
    .where('r.released_at', 'is', null)
    .where('t.ended_at', 'is', null);
  if (dockIds !== 'all') query = query.where('r.dock_id', '=', sql<string>`any(${[...dockIds]}::uuid[])`);
  return query
    .select(['r.task_id', 't.title', 'u.fleet_number', 'd.name as dock_name', 'r.quantity'])
    .orderBy('r.reserved_at')
    .execute();
}
