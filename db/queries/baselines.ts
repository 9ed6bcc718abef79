import { sql, type Insertable, type Kysely } from 'kysely';
import type { BaselineTable, DB } from '../tables';

export type BaselineRow = Awaited<ReturnType<typeof listBaselines>>[number];

function selectBaselines(db: Kysely<DB>) {
  return db
    .selectFrom('baseline')
    .innerJoin('rule', 'rule.id', 'baseline.rule_id')
    .leftJoin('person as recorder', 'recorder.id', 'baseline.recorded_by')
    .leftJoin('person as withdrawer', 'withdrawer.id', 'baseline.withdrawn_by')
    .selectAll('baseline')
    .select([
      'rule.name as rule_name',
      'recorder.name as recorded_by_name',
      'withdrawer.name as withdrawn_by_name',
    ]);
}

/** The baselines of a unit, withdrawn ones too, by rule and the latest first. */
export function listBaselines(db: Kysely<DB>, unitId: string) {
  return selectBaselines(db)
    .where('baseline.unit_id', '=', unitId)
    .orderBy('rule.name')
    .orderBy('baseline.closed_on', 'desc')
    .orderBy('baseline.recorded_at', 'desc')
    .execute();
}

/** The baseline of this id, withdrawn or not, with its rule and whom it names. */
export function findBaseline(db: Kysely<DB>, id: string): Promise<BaselineRow | undefined> {
  return selectBaselines(db).where('baseline.id', '=', id).executeTakeFirst();
}

/** Stores that a rule was last done on a unit; answers its id. */
export function insertBaseline(db: Kysely<DB>, row: Insertable<BaselineTable>): Promise<{ id: string }> {
  return db.insertInto('baseline').values(row).returning('id').executeTakeFirstOrThrow();
}

/** Withdraws a baseline; answers whether it stood until now. */
export async function withdrawBaseline(
  db: Kysely<DB>,
  id: string,
  by: { withdrawn_at: Date; withdrawn_by: string | null },
): Promise<boolean> {
  const { numUpdatedRows } = await db
    .updateTable('baseline')
    .set(by)
    .where('id', '=', id)
    .where('withdrawn_at', 'is', null)
    .executeTakeFirst();
  return numUpdatedRows > 0n;
}

/**
 * How many outings the records of this unit show by the end of a day at its dock: those it came with, once it
 * was here, and those that ended since.
 */
export async function getOutingsBy(db: Kysely<DB>, unitId: string, day: string): Promise<number> {
  const { rows } = await sql<{ outings: number }>`
    select (case when ${day}::date >= (coalesce(
                (select min(r.taken_at) from reading r where r.unit_id = u.id and r.voided_at is null),
                u.created_at) at time zone d.time_zone)::date
              then m.starting_outings else 0 end
            + (select count(*) from outing o
                where o.unit_id = u.id and o.voided_at is null
                  and (o.ended_at at time zone d.time_zone)::date <= ${day}::date))::int as outings
      from unit u join dock d on d.id = u.dock_id join live_meter m on m.unit_id = u.id
     where u.id = ${unitId}`.execute(db);
  return rows[0]?.outings ?? 0;
}
