import { execFileSync } from 'node:child_process';
import path from 'node:path';
import { describe, expect, it } from 'vitest';
import { addDays, localDay, startOfLocalDay } from '@/lib/domain/calendar-day';

const SCRIPT = path.join(import.meta.dirname, '../../support/due-in-time-zone.ts');
/** The widest apart, one with half an hour, one whose summer time is half an hour, and UTC. */
const PROCESS_ZONES = [
  'UTC',
  'Pacific/Kiritimati',
  'Pacific/Pago_Pago',
  'America/St_Johns',
  'Australia/Lord_Howe',
];

type Printed = { offset: number; results: { points: { dueOn?: string }[] } };

const runIn = (TZ: string): Printed =>
  JSON.parse(
    execFileSync(process.execPath, ['--import', 'tsx', SCRIPT], {
      env: { ...process.env, TZ },
      encoding: 'utf8',
    }),
  ) as Printed;

describe('the time zone of the process', () => {
  it('changes no due point, state or local day, in five zones', { timeout: 60_000 }, () => {
    const runs = PROCESS_ZONES.map(runIn);
    expect(new Set(runs.map(({ offset }) => offset)).size).toBe(PROCESS_ZONES.length);
    for (const { results } of runs) expect(results).toEqual(runs[0]!.results);
    // By hand: closed on Saturday 7 March at 51.0 h. The daily rule was due on 1 March with one day's grace, so
    // it starts again; the Sunday rule was due on 1 March, too late by more than a day: the next Sunday.
    expect(runs[0]!.results.points).toMatchObject([
      { dueTenths: 1000 },
      { dueOn: '2026-03-08' },
      { dueOn: '2026-03-08' },
      { dueOn: '2026-04-07' },
    ]);
  });
});

describe('the day at a dock', () => {
  // US clocks changed on 8 March and 1 November 2026, those of the EU on 29 March and 25 October (15 USC 260a;
  // Directive 2000/84/EC; from memory). The instants are worked by hand from the offsets.
  it.each([
    ['America/New_York', '2026-03-08', '2026-03-08T05:00:00.000Z', 23],
    ['America/New_York', '2026-03-09', '2026-03-09T04:00:00.000Z', 24],
    ['America/New_York', '2026-11-01', '2026-11-01T04:00:00.000Z', 25],
    ['America/New_York', '2026-11-02', '2026-11-02T05:00:00.000Z', 24],
    ['Europe/Madrid', '2026-03-29', '2026-03-28T23:00:00.000Z', 23],
    ['Europe/Madrid', '2026-03-30', '2026-03-29T22:00:00.000Z', 24],
    ['Europe/Madrid', '2026-10-25', '2026-10-24T22:00:00.000Z', 25],
    ['Europe/Madrid', '2026-10-26', '2026-10-25T23:00:00.000Z', 24],
  ])('in %s, %s begins at %s and has %s hours', (zone, day, begins, hours) => {
    const start = startOfLocalDay(day, zone);
    expect(start.toISOString()).toBe(begins);
    expect(startOfLocalDay(addDays(day, 1), zone).getTime() - start.getTime()).toBe(hours * 3_600_000);
    expect(localDay(start, zone)).toBe(day);
    expect(localDay(new Date(start.getTime() - 1), zone)).toBe(addDays(day, -1));
  });

  it(
    'begins as the system time zone database has it, every day of 2024 and 2025',
    { timeout: 60_000 },
    () => {
      // Santiago and Cairo skip midnight itself when the clock goes forward; Lord Howe moves by half an hour.
      const zones = [
        'America/Santiago',
        'Africa/Cairo',
        'Australia/Lord_Howe',
        'Asia/Kolkata',
        'Europe/London',
      ];
      const script = `
import datetime, json, sys, zoneinfo
days = [datetime.datetime(2024, 1, 1) + datetime.timedelta(days=n) for n in range(731)]
def begin(day, zone):
    return int(day.replace(tzinfo=zoneinfo.ZoneInfo(zone)).timestamp())
print(json.dumps({zone: [begin(day, zone) for day in days] for zone in sys.argv[1:]}))`;
      const judged = JSON.parse(
        execFileSync('/usr/bin/python3', ['-c', script, ...zones], { encoding: 'utf8' }),
      ) as Record<string, number[]>;
      for (const zone of zones) {
        const ours = judged[zone]!.map((_, index) => startOfLocalDay(addDays('2024-01-01', index), zone));
        expect(
          ours.map((start) => start.getTime() / 1000),
          zone,
        ).toEqual(judged[zone]);
      }
    },
  );

  it('is refused for a zone that does not exist', () => {
    expect(() => localDay(new Date(0), 'Lake/Nowhere')).toThrow(RangeError);
  });
});
