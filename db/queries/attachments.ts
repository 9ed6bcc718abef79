import { sql, type Insertable, type Kysely } from 'kysely';
import type { AttachmentTable, DB } from '../tables';

/** A picture or document with what its unit says of it. */
export type AttachmentRow = NonNullable<Awaited<ReturnType<typeof findAttachment>>>;

function selectAttachments(db: Kysely<DB>) {
  return db
    .selectFrom('attachment as a')
    .innerJoin('unit as u', 'u.id', 'a.unit_id')
    .leftJoin('person as author', 'author.id', 'a.added_by')
    .leftJoin('defect as f', 'f.id', 'a.defect_id')
    .leftJoin('task as t', 't.id', 'a.task_id')
    .selectAll('a')
    .select(['u.dock_id', 'author.name as author_name', 'f.title as defect_title', 't.title as task_title']);
}

/** The attachment of this id, removed or not. */
export function findAttachment(db: Kysely<DB>, id: string) {
  return selectAttachments(db).where('a.id', '=', id).executeTakeFirst();
}

/** What a unit has that is not removed, the latest first; of a task also what its defect has. */
export function listAttachments(db: Kysely<DB>, of: { unitId?: string; taskId?: string; defectId?: string }) {
  let query = selectAttachments(db).where('a.removed_at', 'is', null);
  if (of.unitId) query = query.where('a.unit_id', '=', of.unitId);
  if (of.defectId) query = query.where('a.defect_id', '=', of.defectId);
  if (of.taskId)
    query = query.where((eb) =>
      eb.or([
        eb('a.task_id', '=', of.taskId!),
        eb(
          'a.defect_id',
          '=',
          eb.selectFrom('task').where('task.id', '=', of.taskId!).select('task.defect_id'),
        ),
      ]),
    );
  return query.orderBy('a.added_at', 'desc').orderBy('a.id').limit(500).execute();
}

/** Stores an attachment whose files are in the store already. */
export async function insertAttachment(db: Kysely<DB>, row: Insertable<AttachmentTable>): Promise<void> {
  await db.insertInto('attachment').values(row).execute();
}

/** Marks an attachment removed, or there again. */
export async function updateRemoved(
  db: Kysely<DB>,
  id: string,
  removed: { removed_at: Date | null; removed_by: string | null },
): Promise<void> {
  await db.updateTable('attachment').set(removed).where('id', '=', id).execute();
}

/** Whether an entry of a task that has ended names the attachment: it is part of a record. */
export async function isOnRecord(db: Kysely<DB>, id: string): Promise<boolean> {
  const row = await db
    .selectFrom('step_entry as e')
    .innerJoin('task as t', 't.id', 'e.task_id')
    .innerJoin('attachment as a', 'a.task_id', 't.id')
    .where('a.id', '=', id)
    .where('t.ended_at', 'is not', null)
    .where(sql<boolean>`e.value->'attachmentIds' ? ${id}`)
    .select('e.id')
    .limit(1)
    .executeTakeFirst();
  return row !== undefined;
}

/** Deletes what was removed before then; answers the files it had. */
export async function deleteRemoved(db: Kysely<DB>, before: Date): Promise<string[]> {
  const rows = await db
    .deleteFrom('attachment')
    .where('removed_at', '<', before)
    .returning(['object_key', 'thumb_key'])
    .execute();
  return rows.flatMap((row) => [row.object_key, ...(row.thumb_key ? [row.thumb_key] : [])]);
}

/** Those of these files that a record points to. */
export async function listKnownKeys(db: Kysely<DB>, keys: readonly string[]): Promise<Set<string>> {
  if (keys.length === 0) return new Set();
  const rows = await db
    .selectFrom('attachment')
    .where((eb) => eb.or([eb('object_key', 'in', [...keys]), eb('thumb_key', 'in', [...keys])]))
    .select(['object_key', 'thumb_key'])
    .execute();
  return new Set(rows.flatMap((row) => [row.object_key, ...(row.thumb_key ? [row.thumb_key] : [])]));
}
