/** Prints due results and local days as this process computes them; run under different TZ settings. */
import { addDays, isCalendarDay, localDay, startOfLocalDay, weekdayOf } from '@/lib/domain/calendar-day';
import { computeDuePoints, computeFollowing, computeState } from '@/lib/domain/due';
import type { Schedule } from '@/lib/domain/rule';

const schedule: Schedule = {
  triggers: [
    { on: 'engine_hours', every: 500, anchor: 'scheduled' },
    { on: 'calendar', rrule: 'FREQ=DAILY', start: '2026-03-01', anchor: 'scheduled' },
    { on: 'calendar', rrule: 'FREQ=WEEKLY;BYDAY=SU', start: '2026-03-01', anchor: 'scheduled' },
    { on: 'calendar', rrule: 'FREQ=MONTHLY', start: '2026-01-31', anchor: 'completed' },
  ],
  lead: { tenths: 50, outings: 0, days: 2 },
  window: { earlyTenths: 0, lateTenths: 50, earlyOutings: 0, lateOutings: 0, earlyDays: 1, lateDays: 1 },
};
const history = {
  enteredServiceOn: '2026-01-15',
  closings: [{ on: '2026-03-07', engineHoursTenths: 510, outings: 12 }],
};

/** Every two hours across the changes of clock of two zones in 2026. */
const zones = {
  'America/New_York': ['2026-03-07T22:00:00Z', '2026-10-31T22:00:00Z'],
  'Europe/Madrid': ['2026-03-28T16:00:00Z', '2026-10-24T16:00:00Z'],
};
const points = computeDuePoints(schedule, history);
const local = Object.entries(zones).map(([zone, begins]) =>
  begins.map((begin) =>
    Array.from({ length: 30 }, (_, index) => {
      const today = localDay(new Date(Date.parse(begin) + index * 7_200_000), zone);
      const states = points.map((point) =>
        computeState(point, { engineHoursTenths: 1001, outings: 30, today }),
      );
      return { today, states, begins: startOfLocalDay(today, zone).toISOString() };
    }),
  ),
);

process.stdout.write(
  JSON.stringify({
    offset: new Date('2026-07-01T00:00:00Z').getTimezoneOffset(),
    results: {
      points,
      local,
      following: schedule.triggers.map((trigger) => computeFollowing(trigger, schedule, history, 40)),
      days: [addDays('2026-03-07', 1), addDays('2026-10-31', 1), weekdayOf('2026-03-29')],
      real: ['2026-03-29', '2026-02-29'].map(isCalendarDay),
    },
  }),
);
