import { sql, type Kysely, type RawBuilder } from 'kysely';
import type { DB } from '../tables';
import { LATEST_FIRST } from './reading-order';

/**
 * One entry of a unit's history. `place` is its instant to the microsecond, `rank` orders those of one instant (the
 * higher is the later), `facts` what its kind says of it.
 */
export type HistoryRow = {
  kind: string;
  rank: number;
  id: string;
  place: string;
  facts: Record<string, unknown>;
};

/** Where a page goes on: after this entry. */
type After = { at: string; rank: number; id: string } | null;

const text = (instant: RawBuilder<unknown>) =>
  sql`to_char(${instant} at time zone 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS.US"Z"')`;

const nameOf = (column: string) => sql`(select name from person where id = ${sql.ref(column)})`;

const voidedOf = (alias: string) =>
  sql`'voidedAt', ${text(sql.ref(`${alias}.voided_at`))}, 'voidedBy', ${nameOf(`${alias}.voided_by`)},
      'voidReason', ${sql.ref(`${alias}.void_reason`)}`;

const isSwap = sql`r.source in ('swap_final', 'swap_first')`;

/**
 * What happened to a unit, the latest first, void and reversed entries included, in one statement. Without a
 * `kind`, a reading that came with an outing is part of the outing's entry.
 */
export async function listHistory(
  db: Kysely<DB>,
  unitId: string,
  asked: { kind: string | null; after: After; limit: number },
): Promise<HistoryRow[]> {
  const { kind, after, limit } = asked;
  const branches = Object.entries(BRANCHES).filter(([name]) => kind === null || name === kind);
  const goesOn = after
    ? sql`(at, rank, id) < (${after.at}::timestamptz, ${after.rank}::int, ${after.id}::uuid)`
    : sql`true`;
  const pages = branches.map(
    ([name, from]) => sql`
      (select * from (select ${sql.lit(name)} as kind, ${sql.lit(RANKED.indexOf(name))} as rank, id, at, facts
                         from (${from(unitId, kind !== null)}) e) ranked
        where ${goesOn} order by at desc, rank desc, id desc limit ${limit})`,
  );
  const { rows } = await sql<HistoryRow>`
    select kind, rank, id, ${text(sql`at`)} as place, facts from (${sql.join(pages, sql` union all `)}) every
     order by at desc, rank desc, id desc limit ${limit}`.execute(db);
  return rows;
}

type Branch = (unitId: string, alone: boolean) => RawBuilder<unknown>;

/** The live rows and the others apart, since an index holds either. */
const bothWays = (mark: string, select: (condition: RawBuilder<unknown>) => RawBuilder<unknown>) =>
  sql`${select(sql`${sql.ref(mark)} is null`)} union all ${select(sql`${sql.ref(mark)} is not null`)}`;

const outings: Branch = (unitId) =>
  bothWays(
    'o.voided_at',
    (condition) => sql`
      select o.id, coalesce(o.started_at, o.ended_at) as at, json_build_object(
               'dockName', d.name, 'startedAt', ${text(sql`o.started_at`)}, 'endedAt', ${text(sql`o.ended_at`)},
               'checkedOutBy', ${nameOf('o.checked_out_by')}, 'checkedInBy', ${nameOf('o.checked_in_by')},
               'readingId', r.id, 'engineHours', r.engine_hours_tenths / 10.0, ${voidedOf('o')}) as facts
        from outing o join dock d on d.id = o.dock_id
        left join lateral (select * from reading r where r.outing_id = o.id and r.voided_at is null
                            order by ${LATEST_FIRST} limit 1) r on true
       where o.unit_id = ${unitId} and ${condition}`,
  );

const readings: Branch = (unitId, alone) =>
  bothWays(
    'r.voided_at',
    (condition) => sql`
      select r.id, r.taken_at as at, json_build_object(
               'source', r.source, 'engineHours', r.engine_hours_tenths / 10.0,
               'shownHours', r.shown_tenths / 10.0, 'confirmReason', r.confirm_reason, 'review', r.review_code,
               'reviewedAt', ${text(sql`r.reviewed_at`)}, 'recordedBy', ${nameOf('r.recorded_by')},
               'replacesReadingId', r.replaces_reading_id, 'outingId', r.outing_id, ${voidedOf('r')}) as facts
        from reading r
       where r.unit_id = ${unitId} and ${condition} and not (${isSwap})
         and (${alone} or r.outing_id is null or r.voided_at is not null)`,
  );

/** Both readings of a swap are void or neither is; each way has an index. */
const meterSwaps: Branch = (unitId) =>
  sql`${swapsThat(sql`is null`, unitId)} union all ${swapsThat(sql`is not null`, unitId)}`;

const swapsThat = (voided: RawBuilder<unknown>, unitId: string) => sql`
      select r.id, r.taken_at as at, json_build_object(
               'engineHours', r.engine_hours_tenths / 10.0, 'oldFinal', r.shown_tenths / 10.0,
               'newFirst', (select n.shown_tenths / 10.0 from reading n
                             where n.unit_id = r.unit_id and n.taken_at = r.taken_at and n.source = 'swap_first'
                               and n.voided_at ${voided} limit 1),
               'recordedBy', ${nameOf('r.recorded_by')}, ${voidedOf('r')}) as facts
        from reading r
       where r.unit_id = ${unitId} and r.voided_at ${voided} and r.source = 'swap_final'`;

const closures: Branch = (unitId) =>
  bothWays(
    'c.reversed_at',
    (condition) => sql`
      select c.id, c.closed_at as at, json_build_object(
               'taskId', c.task_id, 'taskKind', t.kind, 'title', t.title,
               'engineHours', c.engine_hours_tenths / 10.0, 'outings', c.outings, 'note', c.note,
               'closedBy', ${nameOf('c.closed_by')}, 'reversedAt', ${text(sql`c.reversed_at`)},
               'reversedBy', ${nameOf('c.reversed_by')}, 'reverseReason', c.reverse_reason) as facts
        from closure c join task t on t.id = c.task_id
       where c.unit_id = ${unitId} and ${condition}`,
  );

const defects: Branch = (unitId) => sql`
  select f.id, f.reported_at as at, json_build_object(
           'title', f.title, 'detail', f.detail, 'holdsUnit', f.holds_unit,
           'reportedBy', ${nameOf('f.reported_by')}, 'clearedAt', ${text(sql`f.cleared_at`)},
           'clearedBy', ${nameOf('f.cleared_by')}, 'clearNote', f.clear_note) as facts
    from defect f where f.unit_id = ${unitId}`;

const layUps: Branch = (unitId) => sql`
  select l.id, l.recorded_at as at, json_build_object(
           'fromOn', l.from_on, 'untilOn', l.until_on, 'reason', l.reason,
           'recordedBy', ${nameOf('l.recorded_by')}, 'endedAt', ${text(sql`l.ended_at`)}) as facts
    from lay_up l where l.unit_id = ${unitId}`;

/** In the order of what happens at one instant: a meter is swapped, then read, then the outing has ended. */
const BRANCHES: Record<string, Branch> = {
  meter_swap: meterSwaps,
  reading: readings,
  outing: outings,
  closure: closures,
  defect: defects,
  lay_up: layUps,
};
const RANKED = Object.keys(BRANCHES);
