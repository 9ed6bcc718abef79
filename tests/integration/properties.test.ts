import fc from 'fast-check';
import { sql } from 'kysely';
import { describe, expect, test } from 'vitest';
import { recountLiveMeter } from '@/db/queries/readings';
import { runTransaction } from '@/db/transaction';
import { getAvailability } from '@/lib/actions/get-availability';
import { correctDuePoints } from '@/lib/actions/correct-due-points';
import { asSystem } from '../support/crew';
import { testDatabase } from '../support/database';
import { anyHistory, KINDS, live, openFleet, type Fleet } from '../support/random-history';

const database = testDatabase({ keep: true });

/** A failing history is not made shorter: each shortening would live another 200 steps. */
const runs = (numRuns: number, seed: number) => ({ numRuns, seed, endOnFailure: true });

async function readPoints({ db, unitIds }: Fleet) {
  const query = db.selectFrom('due_point').selectAll().where('unit_id', 'in', unitIds);
  return query.orderBy('unit_id').orderBy('rule_id').orderBy('trigger_index').execute();
}

async function readMeters({ db, unitIds }: Fleet): Promise<unknown[]> {
  const rows = await db
    .selectFrom('live_meter')
    .selectAll()
    .where('unit_id', 'in', unitIds)
    .orderBy('unit_id')
    .execute();
  return rows.map(({ revision: _writes, ...meter }) => meter);
}

/** Forgets everything that is derived, and derives it anew from the facts. Answers how many due points that made. */
async function deriveAnew(fleet: Fleet, now: Date): Promise<number> {
  const { db, unitIds } = fleet;
  await db.deleteFrom('due_point').where('unit_id', 'in', unitIds).execute();
  await runTransaction(db, async (trx) => {
    for (const unitId of unitIds) {
      const nothing = { shown_tenths: 0, base_tenths: 0, engine_hours_tenths: 0, outing_count: 0 };
      await trx.updateTable('live_meter').set(nothing).where('unit_id', '=', unitId).execute();
      await recountLiveMeter(trx, unitId);
    }
  });
  return correctDuePoints(asSystem(db, now), unitIds);
}

/** Takes every fact out and puts it back in another order. */
async function shuffleFacts({ db, unitIds }: Fleet, order: string): Promise<void> {
  await runTransaction(db, async (trx) => {
    const readings = sql`id, unit_id, taken_at, shown_tenths, base_tenths, source, outing_id, recorded_at, recorded_by,
      confirm_reason, review_code, voided_at, void_reason, replaces_reading_id`;
    const tables = [
      ['reading', readings],
      ['outing', sql`*`],
      ['closure', sql`*`],
      ['baseline', sql`*`],
    ] as const;
    for (const [table, columns] of tables) {
      const from = sql.table(table);
      await sql`create temporary table ${sql.raw(`kept_${table}`)} on commit drop as
        select ${columns} from ${from} where unit_id = any(${unitIds}::uuid[])`.execute(trx);
      await sql`delete from ${from} where unit_id = any(${unitIds}::uuid[])`.execute(trx);
    }
    for (const [table, columns] of [...tables].sort(([a], [b]) =>
      a === 'outing' ? -1 : b === 'outing' ? 1 : 0,
    ))
      await sql`insert into ${sql.table(table)} ${columns === readings ? sql`(${readings})` : sql``}
        select ${columns} from ${sql.raw(`kept_${table}`)} order by md5(id::text || ${order})`.execute(trx);
  });
}

describe('whatever happens to a fleet in 200 steps', () => {
  test('due points kept up step by step are those that all facts give at once, in any order of the facts', async () => {
    const happened = new Set<string>();
    const property = fc.asyncProperty(anyHistory, fc.string(), async (history, order) => {
      const fleet = await openFleet(database.db);
      const { accepted, now } = await live(fleet, history);
      expect(accepted.length).toBeGreaterThan(120);
      accepted.forEach((kind) => happened.add(kind));
      const [points, meters] = [await readPoints(fleet), await readMeters(fleet)];
      expect(points.length).toBeGreaterThan(2);

      expect(await correctDuePoints(asSystem(database.db, now), fleet.unitIds)).toBe(0);
      expect(await readPoints(fleet)).toEqual(points);

      expect(await deriveAnew(fleet, now)).toBe(points.length);
      expect([await readPoints(fleet), await readMeters(fleet)]).toEqual([points, meters]);

      await shuffleFacts(fleet, order);
      await deriveAnew(fleet, now);
      expect([await readPoints(fleet), await readMeters(fleet)]).toEqual([points, meters]);
    });
    await fc.assert(property, runs(6, 77));
    expect(happened).toEqual(new Set(KINDS));
  }, 600_000);

  test('a unit overdue under a rule that holds is never ready, and hours alone move no due point', async () => {
    let overdueSeen = 0;
    const property = fc.asyncProperty(anyHistory, async (history) => {
      const fleet = await openFleet(database.db);
      const last = new Map<string, unknown>();
      await live(fleet, history, async ({ kind }, now, unitId) => {
        const points = (await readPoints(fleet)).filter((point) => point.unit_id === unitId);
        if (kind === 'hire' && last.has(unitId)) expect(points).toEqual(last.get(unitId));
        if (kind === 'edit') last.clear();
        last.set(unitId, points);
        const { ready } = await getAvailability(asSystem(fleet.db, now), { dockId: fleet.dockId });
        const overdue = await listOverdue(fleet, now);
        overdueSeen += overdue.length;
        expect(ready.filter((unit) => overdue.includes(unit.unitId))).toEqual([]);
      });
    });
    await fc.assert(property, runs(3, 1127));
    expect(overdueSeen).toBeGreaterThan(100);
  }, 600_000);
});

/** The units past the end of a holding rule's window, by the words of the rule: `≥` on a meter, after the last day. */
async function listOverdue({ db, unitIds, ruleIds }: Fleet, now: Date): Promise<string[]> {
  const today = new Intl.DateTimeFormat('sv-SE', { timeZone: 'America/Chicago' }).format(now);
  const rules = await db.selectFrom('rule').selectAll().where('id', 'in', ruleIds).execute();
  const meters = await db.selectFrom('live_meter').selectAll().where('unit_id', 'in', unitIds).execute();
  const points = await db.selectFrom('due_point').selectAll().where('unit_id', 'in', unitIds).execute();
  const daysAfter = (from: string) => (Date.parse(today) - Date.parse(from)) / 86_400_000;
  const late = points.filter((point) => {
    const { tolerance, holds_unit } = rules.find(({ id }) => id === point.rule_id)!;
    const meter = meters.find(({ unit_id }) => unit_id === point.unit_id)!;
    if (!holds_unit) return false;
    if (point.due_tenths !== null)
      return meter.engine_hours_tenths >= point.due_tenths + tolerance.lateTenths;
    if (point.due_outings !== null) return meter.outing_count >= point.due_outings + tolerance.lateOutings;
    return daysAfter(point.due_on!) > tolerance.lateDays;
  });
  return late.map(({ unit_id }) => unit_id);
}
