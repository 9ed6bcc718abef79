import type { Insertable, Kysely } from 'kysely';
import type { DB, DefectTable } from '../tables';

/** A defect with what its unit says of it. */
export type DefectRow = NonNullable<Awaited<ReturnType<typeof findDefect>>>;

function selectDefects(db: Kysely<DB>) {
  return db
    .selectFrom('defect')
    .innerJoin('unit', 'unit.id', 'defect.unit_id')
    .leftJoin('person as reporter', 'reporter.id', 'defect.reported_by')
    .leftJoin('person as clearer', 'clearer.id', 'defect.cleared_by')
    .selectAll('defect')
    .select([
      'unit.fleet_number',
      'unit.dock_id',
      'reporter.name as reporter_name',
      'clearer.name as clearer_name',
    ]);
}

/** The defect of this id, cleared or not. */
export function findDefect(db: Kysely<DB>, id: string) {
  return selectDefects(db).where('defect.id', '=', id).executeTakeFirst();
}

/** Defects of these docks, the latest reported first; `unitId` and `open` narrow them. */
export function listDefects(
  db: Kysely<DB>,
  dockIds: 'all' | readonly string[],
  { unitId, open }: { unitId?: string; open?: boolean },
) {
  let query = selectDefects(db).orderBy('defect.reported_at', 'desc').orderBy('defect.id').limit(500);
  if (dockIds !== 'all') query = query.where('unit.dock_id', 'in', [...dockIds]);
  if (unitId) query = query.where('defect.unit_id', '=', unitId);
  if (open !== undefined) query = query.where('defect.cleared_at', open ? 'is' : 'is not', null);
  return query.execute();
}

/** Stores a reported defect; answers its id. */
export function insertDefect(db: Kysely<DB>, row: Insertable<DefectTable>) {
  return db.insertInto('defect').values(row).returning('id').executeTakeFirstOrThrow();
}

/** Marks the defect cleared, unless it is already. Answers whether it was open. */
export async function clearDefect(
  db: Kysely<DB>,
  id: string,
  cleared: { at: Date; by: string | null; note: string },
): Promise<boolean> {
  const row = await db
    .updateTable('defect')
    .set({ cleared_at: cleared.at, cleared_by: cleared.by, clear_note: cleared.note })
    .where('id', '=', id)
    .where('cleared_at', 'is', null)
    .returning('id')
    .executeTakeFirst();
  return row !== undefined;
}

/** Withdraws the defect's open task if nobody has begun it. */
export async function withdrawDefectTask(
  db: Kysely<DB>,
  defectId: string,
  withdrawn: { at: Date; by: string | null; reason: string },
): Promise<void> {
  await db
    .updateTable('task')
    .set((eb) => ({
      ended_at: withdrawn.at,
      withdrawn_by: withdrawn.by,
      withdraw_reason: withdrawn.reason,
      revision: eb('revision', '+', 1),
    }))
    .where('defect_id', '=', defectId)
    .where('ended_at', 'is', null)
    .where('started_at', 'is', null)
    .execute();
}

/** Opens a defect again, whose clearing was a mistake. */
export async function reopenDefect(db: Kysely<DB>, id: string): Promise<void> {
  await db
    .updateTable('defect')
    .set({ cleared_at: null, cleared_by: null, clear_note: null })
    .where('id', '=', id)
    .execute();
}
