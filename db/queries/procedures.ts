import { sql, type Kysely, type Transaction } from 'kysely';
import type { DB, ProcedureTable, ProcedureVersionTable } from '../tables';
import type { Insertable, Selectable, Updateable } from 'kysely';

/** A procedure with its latest version, and the docks' rules that name it. */
export type ProcedureRow = Selectable<ProcedureTable> & {
  version_id: string;
  version: number;
  steps: Selectable<ProcedureVersionTable>['steps'];
  written_at: Date;
  written_by: string | null;
  writer_name: string | null;
  rule_names: string[];
};

function selectProcedures(db: Kysely<DB>) {
  return db
    .selectFrom('procedure as c')
    .innerJoin('procedure_version as v', 'v.procedure_id', 'c.id')
    .leftJoin('person as writer', 'writer.id', 'v.written_by')
    .where(
      sql<boolean>`v.version = (select max(l.version) from procedure_version l where l.procedure_id = c.id)`,
    )
    .selectAll('c')
    .select([
      'v.id as version_id',
      'v.version',
      'v.steps',
      'v.written_at',
      'v.written_by',
      'writer.name as writer_name',
    ])
    .select(
      sql<
        string[]
      >`array(select r.name from rule r where r.procedure_id = c.id and r.ended_at is null order by r.name)`.as(
        'rule_names',
      ),
    );
}

/** The procedures in use, by name. */
export function listProcedures(db: Kysely<DB>): Promise<ProcedureRow[]> {
  return selectProcedures(db).where('c.retired_at', 'is', null).orderBy('c.name').execute();
}

/** The procedure, retired or in use. */
export function findProcedure(db: Kysely<DB>, id: string): Promise<ProcedureRow | undefined> {
  return selectProcedures(db).where('c.id', '=', id).executeTakeFirst();
}

/** Locks the procedure against every other writer of it until the transaction ends. */
export async function lockProcedure(trx: Transaction<DB>, id: string): Promise<void> {
  await trx.selectFrom('procedure').select('id').where('id', '=', id).forUpdate().execute();
}

export type VersionRow = {
  version: number;
  steps: Selectable<ProcedureVersionTable>['steps'];
  note: string | null;
  written_at: Date;
  written_by: string | null;
  writer_name: string | null;
};

/** Each version of a procedure with who wrote it, the latest first. */
export function listProcedureVersions(db: Kysely<DB>, procedureId: string): Promise<VersionRow[]> {
  return db
    .selectFrom('procedure_version as v')
    .leftJoin('person as writer', 'writer.id', 'v.written_by')
    .where('v.procedure_id', '=', procedureId)
    .select(['v.version', 'v.steps', 'v.note', 'v.written_at', 'v.written_by', 'writer.name as writer_name'])
    .orderBy('v.version', 'desc')
    .execute();
}

/** Adds a procedure, without a version yet. */
export function insertProcedure(db: Kysely<DB>, row: Insertable<ProcedureTable>): Promise<{ id: string }> {
  return db.insertInto('procedure').values(row).returning('id').executeTakeFirstOrThrow();
}

/** Adds the next version of a procedure that the caller has locked or just made. */
export async function insertProcedureVersion(
  db: Kysely<DB>,
  row: Omit<Insertable<ProcedureVersionTable>, 'version'>,
): Promise<void> {
  await db
    .insertInto('procedure_version')
    .values({
      ...row,
      version: sql<number>`(select coalesce(max(version), 0) + 1 from procedure_version
        where procedure_id = ${row.procedure_id})`,
    })
    .execute();
}

/** Changes the columns named of a procedure. */
export async function updateProcedure(
  trx: Transaction<DB>,
  id: string,
  row: Updateable<ProcedureTable>,
): Promise<void> {
  await trx.updateTable('procedure').set(row).where('id', '=', id).execute();
}

/** The latest version of a procedure that is in use. */
export async function findCurrentVersionId(db: Kysely<DB>, procedureId: string): Promise<string | undefined> {
  const row = await findProcedure(db, procedureId);
  return row && row.retired_at === null ? row.version_id : undefined;
}

/** The version that a task keeps, with its procedure's name. */
export function findTaskProcedure(db: Kysely<DB>, taskId: string) {
  return db
    .selectFrom('task as t')
    .innerJoin('procedure_version as v', 'v.id', 't.procedure_version_id')
    .innerJoin('procedure as c', 'c.id', 'v.procedure_id')
    .where('t.id', '=', taskId)
    .select(['c.id', 'c.name', 'v.version', 'v.steps'])
    .executeTakeFirst();
}
