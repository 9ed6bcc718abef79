import type { Insertable, Kysely } from 'kysely';
import type { CalendarDay } from '@/lib/domain/calendar-day';
import type { DB, LayUpTable } from '../tables';

/** A lay-up with what its unit says of it. */
export type LayUpRow = NonNullable<Awaited<ReturnType<typeof findLayUp>>>;

function selectLayUps(db: Kysely<DB>) {
  return db
    .selectFrom('lay_up')
    .innerJoin('unit', 'unit.id', 'lay_up.unit_id')
    .leftJoin('person as recorder', 'recorder.id', 'lay_up.recorded_by')
    .selectAll('lay_up')
    .select(['unit.fleet_number', 'unit.dock_id', 'recorder.name as recorder_name']);
}

/** The lay-up of this id, ended or not. */
export function findLayUp(db: Kysely<DB>, id: string) {
  return selectLayUps(db).where('lay_up.id', '=', id).executeTakeFirst();
}

/** Lay-ups of these docks, the latest first; `unitId` and `open` narrow them. */
export function listLayUps(
  db: Kysely<DB>,
  dockIds: 'all' | readonly string[],
  { unitId, open }: { unitId?: string; open?: boolean },
) {
  let query = selectLayUps(db).orderBy('lay_up.from_on', 'desc').orderBy('lay_up.id').limit(500);
  if (dockIds !== 'all') query = query.where('unit.dock_id', 'in', [...dockIds]);
  if (unitId) query = query.where('lay_up.unit_id', '=', unitId);
  if (open !== undefined) query = query.where('lay_up.ended_at', open ? 'is' : 'is not', null);
  return query.execute();
}

/** Stores a lay-up; answers its id. The index `lay_up_open` keeps one open a unit. */
export function insertLayUp(db: Kysely<DB>, row: Insertable<LayUpTable>) {
  return db.insertInto('lay_up').values(row).returning('id').executeTakeFirstOrThrow();
}

/** Ends the lay-up, unless it has ended already. Answers whether it was open. */
export async function endLayUp(
  db: Kysely<DB>,
  id: string,
  ended: { at: Date; by: string | null },
): Promise<boolean> {
  const row = await db
    .updateTable('lay_up')
    .set({ ended_at: ended.at, ended_by: ended.by })
    .where('id', '=', id)
    .where('ended_at', 'is', null)
    .returning('id')
    .executeTakeFirst();
  return row !== undefined;
}

/** Ends the unit's lay-up whose last day has passed, so that another may begin. */
export async function endPastLayUp(
  db: Kysely<DB>,
  unitId: string,
  today: CalendarDay,
  now: Date,
): Promise<void> {
  await db
    .updateTable('lay_up')
    .set({ ended_at: now })
    .where('unit_id', '=', unitId)
    .where('ended_at', 'is', null)
    .where('until_on', '<', today)
    .execute();
}
