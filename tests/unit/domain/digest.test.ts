import { expect, test } from 'vitest';
import type { DuePoint } from '@/lib/domain/due';
import { computeDigest, countDaysLost, type DockFacts, type DutyFacts } from '@/lib/domain/digest';
import { digestHtml } from '@/lib/domain/digest-html';
import { digestSubject, digestText } from '@/lib/domain/digest-letter';

// Every expectation here is worked by hand on the calendar; the weeks are named beside it.

const dock: DockFacts = {
  dockId: 'd1',
  name: 'North dock',
  timeZone: 'America/New_York',
  today: '2026-11-30',
  season: null,
  openWeekdays: ['MO', 'TU', 'WE', 'TH', 'FR', 'SA', 'SU'],
  duties: [],
  held: [],
  heldTimes: [],
  closed: [],
};
const unit = { unitId: 'u1', fleetNumber: 'J-7' };
const held = (from: string, until: string | null, inServiceFrom = '2026-01-01') => ({
  ...unit,
  from: new Date(from),
  until: until === null ? null : new Date(until),
  inServiceFrom,
});
const lost = (weekOn: string, change: Partial<DockFacts>) =>
  countDaysLost(weekOn, { ...dock, ...change }).get('u1') ?? 0;
const duty = (points: DuePoint[], change: Partial<DutyFacts> = {}): DutyFacts => ({
  ...unit,
  ruleId: 'r1',
  ruleName: 'Impeller check',
  holdsUnit: true,
  points,
  standing: { engineHoursTenths: 1000, outings: 200, today: '2026-11-30' },
  ranTenths: 280,
  ranOutings: 56,
  ...change,
});
const hours = (due: number, late = 0): DuePoint => ({
  on: 'engine_hours',
  dueTenths: due,
  upcomingFromTenths: due - 50,
  overdueFromTenths: due + late,
});
const day = (dueOn: string, overdueFromOn: string): DuePoint => ({
  on: 'calendar',
  dueOn,
  upcomingFromOn: dueOn,
  overdueFromOn,
});
const overdueOf = (duties: DutyFacts[]) =>
  computeDigest('2026-11-30', [{ ...dock, duties }]).docks[0]!.overdue;
const dueOf = (duties: DutyFacts[]) => computeDigest('2026-11-30', [{ ...dock, duties }]).docks[0]!.due;

test('a unit held for the whole week lost all days on which its dock was open', () => {
  // Mon 23 to Sun 29 Nov 2026.
  const heldTimes = [held('2026-11-01T12:00:00Z', null)];
  expect(lost('2026-11-30', { heldTimes })).toBe(7);
  expect(lost('2026-11-30', { heldTimes, openWeekdays: ['FR', 'SA', 'SU'] })).toBe(3);
  // Open to Thu 26 Nov: Mon, Tue, Wed, Thu.
  expect(lost('2026-11-30', { heldTimes, season: { from: '04-01', to: '11-26' } })).toBe(4);
  expect(lost('2026-11-30', { heldTimes, season: { from: '04-01', to: '09-30' } })).toBe(0);
  // A season over the new year, from Sat 28 Nov: Sat, Sun.
  expect(lost('2026-11-30', { heldTimes, season: { from: '11-28', to: '03-31' } })).toBe(2);
});

test('a day is lost to a unit that was held at noon by the clock of its dock', () => {
  // Noon in New York on Tue 24 Nov 2026 is 17:00Z.
  expect(lost('2026-11-30', { heldTimes: [held('2026-11-24T17:00:00Z', '2026-11-24T17:01:00Z')] })).toBe(1);
  expect(lost('2026-11-30', { heldTimes: [held('2026-11-24T17:01:00Z', '2026-11-25T16:59:00Z')] })).toBe(0);
  expect(lost('2026-11-30', { heldTimes: [held('2026-11-24T10:00:00Z', '2026-11-24T17:00:00Z')] })).toBe(0);
});

test('a day with two reasons is one day', () => {
  const heldTimes = [
    held('2026-11-23T05:00:00Z', '2026-11-25T05:00:00Z'),
    held('2026-11-24T05:00:00Z', '2026-11-26T05:00:00Z'),
  ];
  // Mon 23, Tue 24 and Wed 25.
  expect(lost('2026-11-30', { heldTimes })).toBe(3);
});

test('days before a unit entered service are not lost', () => {
  expect(lost('2026-11-30', { heldTimes: [held('2026-11-01T05:00:00Z', null, '2026-11-27')] })).toBe(3);
});

test('in the week the clocks go back, noon moves by an hour in UTC', () => {
  // New York, Sun 1 Nov 2026: noon is 17:00Z; on Sat 31 Oct it is 16:00Z.
  const at = (from: string, until: string) => lost('2026-11-02', { heldTimes: [held(from, until)] });
  expect(at('2026-10-31T16:30:00Z', '2026-11-01T16:30:00Z')).toBe(0);
  expect(at('2026-10-31T15:30:00Z', '2026-11-01T17:30:00Z')).toBe(2);
});

test('in the week the clocks go forward, noon moves by an hour in UTC', () => {
  // New York, Sun 8 Mar 2026: noon is 16:00Z; on Sat 7 Mar it is 17:00Z.
  const at = (from: string, until: string) => lost('2026-03-09', { heldTimes: [held(from, until)] });
  expect(at('2026-03-07T16:30:00Z', '2026-03-08T16:30:00Z')).toBe(2);
  expect(at('2026-03-07T17:30:00Z', '2026-03-08T15:30:00Z')).toBe(0);
});

test('an overdue duty says by how much, by every measure it is late by', () => {
  expect(overdueOf([duty([hours(900, 50)])])[0]).toMatchObject({ late: 'by 5.0 h', holdsUnit: true });
  // Last day Thu 26 Nov, so overdue from the 27th: four days on Mon 30 Nov.
  expect(overdueOf([duty([hours(900), day('2026-11-26', '2026-11-27')])])[0]).toMatchObject({
    late: 'by 10.0 h and 4 days',
  });
  expect(overdueOf([duty([hours(1000)])])[0]).toMatchObject({ late: 'since its last outing' });
  expect(overdueOf([duty([hours(1001)])])).toEqual([]);
});

test('what is due in seven days: by date to Sunday, by hours at the pace of four weeks', () => {
  const named = (points: DuePoint[], change?: Partial<DutyFacts>) => dueOf([duty(points, change)])[0]?.when;
  expect(named([day('2026-12-06', '2026-12-07')])).toBe('on Sun 6 Dec 2026');
  expect(named([day('2026-12-07', '2026-12-08')])).toBeUndefined();
  expect(named([day('2026-11-28', '2026-12-03')])).toBe(
    'since Sat 28 Nov 2026, to be done by Wed 2 Dec 2026',
  );
  // 28.0 h in 28 days is an hour a day: 6.9 h come within seven days, 7.0 h do not.
  expect(named([hours(1069)])).toBe('in 6.9 h');
  expect(named([hours(1070)])).toBeUndefined();
  expect(named([hours(1001)], { ranTenths: 0 })).toBeUndefined();
  expect(named([hours(990, 50)])).toBe('now; 4.0 h before it is overdue');
  // The nearer of two triggers is named: 3.0 h is three days off, Tue 1 Dec one.
  expect(named([hours(1030), day('2026-12-01', '2026-12-02')])).toBe('on Tue 1 Dec 2026');
});

test('a unit that is not held any more still shows the days it lost', () => {
  const facts = {
    ...dock,
    held: [
      {
        unitId: 'u2',
        fleetNumber: 'J-10',
        reasons: ['defect: throttle'],
        since: new Date('2026-11-29T03:00:00Z'),
      },
    ],
    heldTimes: [held('2026-11-24T05:00:00Z', '2026-11-26T05:00:00Z')],
  };
  const { docks, totals } = computeDigest('2026-11-30', [facts]);
  // 03:00Z is still the 28th in New York.
  expect(docks[0]!.held).toEqual([
    { unitId: 'u2', fleetNumber: 'J-10', reasons: ['defect: throttle'], since: '2026-11-28', daysLost: 0 },
    { ...unit, reasons: [], since: null, daysLost: 2 },
  ]);
  expect(totals).toEqual({ overdue: 0, held: 1, daysLost: 2, due: 0, closed: 0 });
});

const links = {
  page: (path: string) => `https://w.example${path}`,
  unsubscribe: 'https://w.example/api/v1/unsubscribe/k',
};

test('the letter names the worst first, links every unit, and lets nobody write markup into it', () => {
  const digest = computeDigest('2026-11-30', [
    { ...dock, name: 'Pier <b>', duties: [duty([hours(900)], { ruleName: '"Rebuild" & check' })] },
  ]);
  expect(digestSubject(digest)).toBe('Week of Mon 30 Nov 2026: 1 overdue');
  const html = digestHtml(digest, links);
  expect(html).toContain('Pier &lt;b&gt;');
  expect(html).toContain('&quot;Rebuild&quot; &amp; check: overdue by 10.0 h; holds the unit');
  expect(html).toContain('href="https://w.example/units/u1"');
  expect(html).not.toContain('<b>');
  expect(digestText(digest, links)).toContain('- J-7: "Rebuild" & check: overdue by 10.0 h; holds the unit');
  expect(digestText(digest, links)).toContain('https://w.example/api/v1/unsubscribe/k');
});

test('a week without news says so', () => {
  const digest = computeDigest('2026-11-30', [dock]);
  expect(digestSubject(digest)).toBe('Week of Mon 30 Nov 2026: nothing overdue, held or due this week');
  expect(digestText(digest, links)).toContain('Nothing is overdue.');
});
