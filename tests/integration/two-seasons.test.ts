import { sql } from 'kysely';
import { describe, expect, test } from 'vitest';
import { getAvailability } from '@/lib/actions/get-availability';
import { refreshDue } from '@/lib/actions/refresh-due';
import { asSystem } from '../support/crew';
import { testDatabase } from '../support/database';
import { loadHires } from '../support/hire-data';
import { meterOf, toDay } from '../support/oracle';
import {
  heldBy,
  hireOut,
  openFleet,
  workMorning,
  type Fleet,
  type SeasonUnit,
} from '../support/season-fleet';

/** One outing for so many hires: 10,333 in all, up to 56 a day. */
const HIRES_TO_AN_OUTING = 60;

const database = testDatabase({ keep: true });

describe('the hires that are published', () => {
  // Totals worked out from the published data with R and Python, apart from our reading of the file.
  test('add up to what is known of them', () => {
    const hires = loadHires();
    const total = (from: string, to: string) =>
      hires.filter(({ on }) => on >= from && on <= to).reduce((sum, { casual }) => sum + casual, 0);
    expect(hires.length).toBe(731);
    expect([hires[0]!.on, hires.at(-1)!.on]).toEqual(['2011-01-01', '2012-12-31']);
    expect(total('2011-01-01', '2012-12-31')).toBe(620_017);
    expect(total('2011-01-01', '2011-01-31')).toBe(3_073);
    expect(total('2011-07-01', '2011-07-31')).toBe(36_452);
    const sorted = [...hires].sort((a, b) => a.casual - b.casual);
    expect(sorted[0]).toEqual({ on: '2012-10-29', casual: 2 });
    expect(sorted.at(-1)).toEqual({ on: '2012-05-19', casual: 3_410 });
    const means = [1, 2, 3, 4, 5, 6, 0].map((weekday) => {
      const days = hires.filter(({ on }) => new Date(on).getUTCDay() === weekday);
      return Math.round(days.reduce((sum, { casual }) => sum + casual, 0) / days.length);
    });
    expect(means).toEqual([674, 556, 551, 591, 752, 1465, 1338]);
  });
});

/** What the oracle says is stored of a unit, a line a trigger. */
function expectedPoints(unit: SeasonUnit): string[] {
  return unit.rules.flatMap(({ rule, points }) =>
    points.map((point, index) => {
      const isDay = rule.oracle.triggers[index]!.on === 'calendar';
      const values = [point.due, point.upcomingFrom, point.overdueFrom];
      return [unit.fleetNumber, rule.input.name, index, ...values.map((v) => (isDay ? toDay(v) : v))].join(
        ' | ',
      );
    }),
  );
}

async function storedPoints({ db }: Fleet): Promise<string[]> {
  const { rows } = await sql<{ line: string }>`
    select concat_ws(' | ', u.fleet_number, r.name, p.trigger_index,
        coalesce(p.due_tenths, p.due_outings)::text, p.due_on,
        coalesce(p.upcoming_from_tenths, p.upcoming_from_outings)::text, p.upcoming_from_on,
        coalesce(p.overdue_from_tenths, p.overdue_from_outings)::text, p.overdue_from_on) as line
      from due_point p join unit u on u.id = p.unit_id join rule r on r.id = p.rule_id`.execute(db);
  return rows.map(({ line }) => line);
}

/** Ready or held, by what, and what is left before a hold, a line a unit. */
function expectedStanding(unit: SeasonUnit, today: string): string {
  const left = (on: 'hours' | 'outings' | 'calendar') => {
    const all = unit.rules.flatMap(({ rule: { oracle }, points }) =>
      points.flatMap((point, index) => {
        const trigger = oracle.triggers[index]!;
        return oracle.holds && trigger.on === on ? [point.overdueFrom - meterOf(trigger, unit, today)] : [];
      }),
    );
    return all.length > 0 ? Math.min(...all) : null;
  };
  const reasons = [...heldBy(unit, today), ...[...unit.defects].map((id) => `defect ${id}`)].sort();
  return JSON.stringify([unit.fleetNumber, reasons, left('hours')! / 10, left('outings'), left('calendar')]);
}

async function shownStanding({ db, units }: Fleet, now: string): Promise<string[]> {
  const { ready, out, held } = await getAvailability(asSystem(db, now), {});
  expect(out).toEqual([]);
  const names = new Map(units.flatMap(({ rules }) => rules.map(({ id, rule }) => [id, rule.input.name])));
  return [...ready.map((unit) => ({ ...unit, holds: [] })), ...held].map((unit) => {
    const reasons = unit.holds.map((hold) =>
      hold.reason === 'overdue' ? names.get(hold.ruleId!) : `${hold.reason} ${hold.defectId ?? ''}`,
    );
    const left = [unit.hoursToHold, unit.outingsToHold, unit.daysToHold];
    return JSON.stringify([unit.fleetNumber, [...new Set(reasons)].sort(), ...left]);
  });
}

describe('two real seasons', () => {
  test('leave every due point and every unit, at the end of each of 731 days, as a slow oracle says', async () => {
    const fleet = await openFleet(database.db);
    const unitIds = fleet.units.map(({ id }) => id);
    let [carried, outings, heldDays, readyDays] = [0, 0, 0, 0];
    for (const { on, casual } of loadHires()) {
      await workMorning(fleet, on);
      carried += casual;
      const count = Math.floor(carried / HIRES_TO_AN_OUTING);
      carried -= count * HIRES_TO_AN_OUTING;
      await refreshDue(asSystem(database.db, `${on}T13:30:00Z`), { unitIds });
      await hireOut(fleet, on, count);
      // Half past ten at night in New York in winter, half past eleven in summer; an hour less in Chicago.
      const night = new Date(Date.parse(`${on}T00:00:00Z`) + 27.5 * 3_600_000).toISOString();
      await refreshDue(asSystem(database.db, night), { unitIds });
      expect((await storedPoints(fleet)).sort(), on).toEqual(fleet.units.flatMap(expectedPoints).sort());
      const standing = fleet.units.map((unit) => expectedStanding(unit, on));
      expect((await shownStanding(fleet, night)).sort(), on).toEqual(standing.sort());
      outings += count;
      const held = fleet.units.filter((unit) => heldBy(unit, on).length > 0).length;
      [heldDays, readyDays] = [heldDays + held, readyDays + unitIds.length - held];
    }
    expect(outings).toBe(Math.floor(620_017 / HIRES_TO_AN_OUTING));
    // The comparison would say little if nothing were ever late, or everything always.
    expect(heldDays).toBeGreaterThan(3_000);
    expect(readyDays).toBeGreaterThan(10_000);
    const closings = fleet.units.flatMap(({ rules }) => rules.map((rule) => rule.closings.length));
    expect(Math.min(...closings)).toBeGreaterThan(1);
  }, 1_200_000);
});
