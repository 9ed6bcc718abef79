import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { addDays, WEEKDAYS } from '@/lib/domain/calendar-day';
import type { Opening } from '@/lib/domain/season';
import { computeDailyUsage, type UsageFacts } from '@/lib/domain/usage';

const always: Opening = { season: null, openWeekdays: WEEKDAYS };
// 2026-06-01 is a Monday.
const facts = (over: Partial<UsageFacts>): UsageFacts => ({
  readings: [],
  outings: [],
  layUps: [],
  opening: always,
  today: '2026-06-15',
  ...over,
});
const at = (on: string, engineHoursTenths: number) => ({ on, engineHoursTenths });

// Worked by hand.
describe('what a unit ran on each day', () => {
  test('is unknown without a reading', () => {
    expect(computeDailyUsage(facts({}))).toBeNull();
  });

  test('is shared equally by the outings between two readings', () => {
    const usage = computeDailyUsage(
      facts({
        readings: [at('2026-06-01', 1000), at('2026-06-05', 1060)],
        outings: ['2026-06-02', '2026-06-04', '2026-06-04'],
        today: '2026-06-06',
      }),
    );
    expect(usage).toMatchObject({ from: '2026-06-01', tenths: [0, 20, 0, 40, 0], outings: [0, 1, 0, 2, 0] });
  });

  test('is shared by the open days where no outing is known: two of a long weekend, the Sunday being shut', () => {
    const usage = computeDailyUsage(
      facts({
        readings: [at('2026-06-05', 100), at('2026-06-08', 160)],
        opening: { season: null, openWeekdays: ['MO', 'TU', 'WE', 'TH', 'FR', 'SA'] },
      }),
    );
    expect(usage).toMatchObject({ tenths: [0, 30, 0, 30], open: [true, true, false, true] });
  });

  test('is nothing out of season and in a lay-up, and what the meter ran then is told apart', () => {
    const usage = computeDailyUsage(
      facts({
        readings: [
          at('2026-06-01', 100),
          at('2026-06-03', 112),
          at('2026-06-07', 120),
          at('2026-06-09', 125),
        ],
        opening: { season: { from: '05-01', to: '06-07' }, openWeekdays: WEEKDAYS },
        layUps: [{ from: '2026-06-02', to: '2026-06-03' }],
      }),
    );
    expect(usage).toMatchObject({
      tenths: [0, 0, 0, 2, 2, 2, 2, 0, 0],
      open: [true, false, false, true, true, true, true, false, false],
      unplacedTenths: 12 + 5,
    });
  });

  test('is zero after the last reading when outings are recorded, and unknown when they are not', () => {
    const readings = [at('2026-06-01', 100), at('2026-06-02', 120)];
    const recorded = computeDailyUsage(facts({ readings, outings: ['2026-06-02'], today: '2026-06-05' }));
    expect(recorded?.tenths).toEqual([0, 20, 0, 0]);
    expect(computeDailyUsage(facts({ readings, today: '2026-06-05' }))?.tenths).toEqual([0, 20]);
  });

  test('leaves out today, and the days since which the unit is out', () => {
    const readings = [at('2026-06-01', 100), at('2026-06-02', 120), at('2026-06-04', 150)];
    const outings = ['2026-06-02', '2026-06-04'];
    expect(computeDailyUsage(facts({ readings, outings, today: '2026-06-04' }))?.tenths).toEqual([0, 20, 0]);
    const out = facts({ readings, outings, today: '2026-06-08', outSince: '2026-06-06' });
    expect(computeDailyUsage(out)?.tenths).toEqual([0, 20, 0, 30, 0]);
  });

  test('is refused when engine hours fall', () => {
    const readings = [at('2026-06-01', 100), at('2026-06-02', 90)];
    expect(() => computeDailyUsage(facts({ readings }))).toThrow(RangeError);
  });
});

test('nothing that ran is lost, and nothing runs on a day that does not count', () => {
  const step = fc.record({ days: fc.integer({ min: 0, max: 9 }), ran: fc.integer({ min: 0, max: 80 }) });
  fc.assert(
    fc.property(
      fc.array(step, { minLength: 2, maxLength: 30 }),
      fc.array(fc.integer({ min: 0, max: 200 }), { maxLength: 40 }),
      fc.subarray([...WEEKDAYS]),
      (steps, outings, openWeekdays) => {
        let reading = at('2026-03-01', 0);
        const readings = steps.map(({ days, ran }) => {
          reading = at(addDays(reading.on, days), reading.engineHoursTenths + ran);
          return reading;
        });
        const usage = computeDailyUsage(
          facts({
            readings,
            outings: outings.map((day) => addDays('2026-03-01', day)),
            opening: { season: { from: '04-01', to: '10-15' }, openWeekdays },
            layUps: [{ from: '2026-05-10', to: '2026-05-20' }],
            today: '2027-03-01',
          }),
        )!;
        const placed = usage.tenths.reduce((sum, tenths) => sum + tenths, 0);
        const ran = readings.at(-1)!.engineHoursTenths - readings[0]!.engineHoursTenths;
        expect(placed + usage.unplacedTenths).toBeCloseTo(ran, 6);
        usage.open.forEach((open, day) => {
          if (!open) expect([usage.tenths[day], usage.outings[day]]).toEqual([0, 0]);
        });
      },
    ),
  );
});
