import { sql } from 'kysely';
import { refreshFleet } from '@/lib/actions/refresh-fleet';
import { atMost, median, ms, timed, type Figure } from './figures';
import type { Setting } from './setting';

const ROUNDS = 5;

/**
 * The whole fleet's due points computed anew, first when all stored ones are wrong, then when all are right, against
 * the one UPDATE that made them wrong.
 */
export async function measureRecompute({ db, ctx }: Setting): Promise<Figure[]> {
  const shift = (by: number) =>
    sql`update due_point set
      due_tenths = due_tenths + ${by}::int, upcoming_from_tenths = upcoming_from_tenths + ${by}::int,
      overdue_from_tenths = overdue_from_tenths + ${by}::int, due_outings = due_outings + ${by}::int,
      upcoming_from_outings = upcoming_from_outings + ${by}::int,
      overdue_from_outings = overdue_from_outings + ${by}::int, due_on = due_on + ${by}::int,
      upcoming_from_on = upcoming_from_on + ${by}::int, overdue_from_on = overdue_from_on + ${by}::int`.execute(
      db,
    );
  const clean = () => sql`vacuum due_point`.execute(db);
  const refresh = async (expected: 'all' | 'none') => {
    const { changed } = await refreshFleet(ctx());
    if (changed !== (expected === 'all' ? points : 0)) throw new Error(`${changed} of ${points} changed`);
  };
  const { points } = await db
    .selectFrom('due_point')
    .select((eb) => eb.fn.countAll<number>().as('points'))
    .executeTakeFirstOrThrow();
  await refreshFleet(ctx());
  const rounds: { update: number; all: number; none: number }[] = [];
  let rowsWritten = 0;
  for (let round = 0; round < ROUNDS; round += 1) {
    await clean();
    const update = await timed(() => shift(1));
    await clean();
    const all = await timed(() => refresh('all'));
    await clean();
    const before = await lastTransaction(db);
    const none = await timed(() => refresh('none'));
    rowsWritten += await countWrittenSince(db, before);
    rounds.push({ update, all, none });
  }
  const update = median(rounds.map((r) => r.update));
  const against = (value: number) => `${ms(value)} to ${ms(update)}`;
  return [
    atMost(
      `recompute of ${points.toLocaleString('en')} due points, all wrong, against one UPDATE`,
      median(rounds.map((r) => r.all / r.update)),
      2,
      against(median(rounds.map((r) => r.all))),
    ),
    atMost(
      'recompute when all are right',
      median(rounds.map((r) => r.none / r.update)),
      0.5,
      against(median(rounds.map((r) => r.none))),
    ),
    {
      what: 'rows written when all are right',
      measured: String(rowsWritten),
      target: '0',
      reached: rowsWritten === 0,
    },
  ];
}

async function lastTransaction(db: Setting['db']): Promise<string> {
  const { rows } = await sql<{
    id: string;
  }>`select pg_snapshot_xmax(pg_current_snapshot())::text as id`.execute(db);
  return rows[0]!.id;
}

/** Rows of what a recompute may write that a transaction from `id` on has written, by their xmin. */
async function countWrittenSince(db: Setting['db'], id: string): Promise<number> {
  const { rows } = await sql<{ rows: number }>`
    select sum(n)::int as rows from (
      select count(*) as n from due_point where xmin::text::bigint >= ${id}::bigint union all
      select count(*) from assessment where xmin::text::bigint >= ${id}::bigint union all
      select count(*) from task where xmin::text::bigint >= ${id}::bigint) as written`.execute(db);
  return rows[0]!.rows;
}
