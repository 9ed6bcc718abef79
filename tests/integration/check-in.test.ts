import { randomUUID } from 'node:crypto';
import { beforeEach, describe, expect, test } from 'vitest';
import { checkIn } from '@/lib/actions/check-in';
import { checkOut } from '@/lib/actions/check-out';
import { logReading } from '@/lib/actions/log-reading';
import type { CreateCheckIn } from '@/lib/schemas/check-in';
import { recordsOf } from '../support/bad-input';
import { asSystem, openDock } from '../support/crew';
import { testDatabase } from '../support/database';

const database = testDatabase();
let unitId: string;

// The unit entered service on Friday 1 May 2026 with 100.0 h; the dock keeps Lisbon's time, UTC+1 in summer.
const at = (time: string) => asSystem(database.db, `2026-06-02T${time}:00Z`);
const back = (time: string, entry: Partial<CreateCheckIn> & { hours: number }) =>
  checkIn(at(time), { id: randomUUID(), unitId, confirmReason: undefined, ...entry });
const out = (time: string) => checkOut(at(time), { id: randomUUID(), unitId });
const meter = () =>
  database.db.selectFrom('live_meter').selectAll().where('unit_id', '=', unitId).executeTakeFirstOrThrow();

beforeEach(async () => {
  ({
    unit: { id: unitId },
  } = await openDock(database.db));
});

describe('a unit that comes back', () => {
  test('has its reading kept, its outing ended and counted, and a refresh of its due points queued', async () => {
    const gone = await out('10:00');
    const answer = await back('11:00', { hours: 100.8 });
    expect(answer).toMatchObject({
      unitId,
      engineHours: 100.8,
      shownHours: 100.8,
      hoursRun: 0.8,
      outings: 1,
    });
    expect(answer).toMatchObject({ outingId: gone.id, review: null, defectId: null });
    expect(await meter()).toMatchObject({
      engine_hours_tenths: 1008,
      outing_count: 1,
      reading_id: answer.id,
    });
    const outing = await database.db.selectFrom('outing').selectAll().executeTakeFirstOrThrow();
    expect(outing).toMatchObject({ id: gone.id, ended_at: new Date('2026-06-02T11:00:00Z') });
    const jobs = await jobsOf('refresh-due');
    expect(jobs).toContain(`refresh-due:${unitId}`);
  });

  test('without having been checked out counts as an outing whose start is unknown', async () => {
    const answer = await back('11:00', { hours: 100.8 });
    expect(answer.outings).toBe(1);
    const outing = await database.db.selectFrom('outing').selectAll().executeTakeFirstOrThrow();
    expect(outing).toMatchObject({ id: answer.outingId, started_at: null });
  });

  test('with a defect has it reported with the reading, and is held by it when it says so', async () => {
    const answer = await back('11:00', {
      hours: 100.4,
      defect: { title: 'Steering stiff', holdsUnit: true },
    });
    const defect = await database.db.selectFrom('defect').selectAll().executeTakeFirstOrThrow();
    expect(defect).toMatchObject({ id: answer.defectId, title: 'Steering stiff', reading_id: answer.id });
    await expect(out('11:10')).rejects.toMatchObject({ code: 'unit_held' });
  });

  test('with a new meter goes on from the engine hours the old one ended with', async () => {
    // 100.0 h to 100.6 h on the old meter, 3.0 h to 3.2 h on the new one: 0.8 h run, 100.8 engine hours.
    const answer = await back('11:00', { hours: 3.2, meterSwap: { oldFinal: 100.6, newFirst: 3 } });
    expect(answer).toMatchObject({ engineHours: 100.8, shownHours: 3.2, hoursRun: 0.8 });
    const readings = await database.db
      .selectFrom('reading')
      .select(['source', 'shown_tenths', 'engine_hours_tenths'])
      .where('source', '!=', 'entry')
      .orderBy('engine_hours_tenths')
      .orderBy('source')
      .execute();
    expect(readings).toEqual([
      { source: 'swap_final', shown_tenths: 1006, engine_hours_tenths: 1006 },
      { source: 'swap_first', shown_tenths: 30, engine_hours_tenths: 1006 },
      { source: 'check_in', shown_tenths: 32, engine_hours_tenths: 1008 },
    ]);
    expect(await back('12:30', { hours: 4 })).toMatchObject({ engineHours: 101.6, hoursRun: 0.8 });
  });

  test('with a new meter read at its first hours is on the new meter', async () => {
    await back('11:00', { hours: 0, meterSwap: { oldFinal: 100.6, newFirst: 0 } });
    expect(await back('12:00', { hours: 0.5 })).toMatchObject({ engineHours: 101.1, shownHours: 0.5 });
  });
});

describe('a reading that cannot be right is refused, nothing changed', () => {
  const refused = async (entry: Partial<CreateCheckIn> & { hours: number }) => {
    const before = await recordsOf(database.db);
    const error: unknown = await back('14:00', entry).catch((thrown: unknown) => thrown);
    expect(await recordsOf(database.db)).toEqual(before);
    return error as { code: string; errors: { path: string; message: string }[] };
  };
  beforeEach(() => back('11:00', { hours: 100.8 }));

  test('lower than the last: names its value, weekday, date and hour at the dock', async () => {
    const { code, errors } = await refused({ hours: 100.7 });
    expect(code).toBe('reading_refused');
    expect(errors).toMatchObject([{ path: 'hours' }]);
    expect(errors[0]!.message).toContain('100.8 h on Tue 2 Jun 2026, 12:00');
  });

  test('more than the clock allows: 3.0 h since, so 103.8 h and two tenths for rounding at most', async () => {
    expect(await refused({ hours: 104.1 })).toMatchObject({
      code: 'reading_refused',
      errors: [{ path: 'hours', message: expect.stringContaining('only 3.0 h have passed') as string }],
    });
    expect(await back('14:00', { hours: 104, confirmReason: 'Left running for a test' })).toMatchObject({
      engineHours: 104,
    });
  });

  test('more than the outing lasted: asks for a reason, and is kept for review with one', async () => {
    await out('13:00');
    expect(await refused({ hours: 102.5 })).toMatchObject({
      code: 'reason_needed',
      errors: [
        { path: 'confirmReason', message: expect.stringContaining('the outing lasted 1.0 h') as string },
      ],
    });
    const kept = await back('14:00', { hours: 102.5, confirmReason: 'Ran ashore on the hose before' });
    expect(kept).toMatchObject({ hoursRun: 1.7, review: 'unusual_jump' });
  });

  test.each([
    [
      'the old meter ends below its last reading',
      { oldFinal: 100.7, newFirst: 0 },
      0.1,
      'meterSwap.oldFinal',
    ],
    ['the new meter shows less than at first', { oldFinal: 100.9, newFirst: 5 }, 4.9, 'hours'],
    ['both meters ran more than the clock', { oldFinal: 102.8, newFirst: 0 }, 2, 'hours'],
  ])('a meter swap where %s', async (_, meterSwap, hours, path) => {
    expect(await refused({ hours, meterSwap })).toMatchObject({
      code: 'reading_refused',
      errors: [{ path }],
    });
  });

  test('of an hour to come, and of one before the unit was there', async () => {
    const later = new Date('2026-06-02T14:06:00Z');
    expect(await refused({ hours: 101, at: later })).toMatchObject({ errors: [{ path: 'at' }] });
    const before = new Date('2026-04-30T10:00:00Z');
    expect(await refused({ hours: 99, at: before })).toMatchObject({ errors: [{ path: 'at' }] });
  });
});

describe('a reading that arrives late', () => {
  beforeEach(async () => {
    await back('10:00', { hours: 100.5 });
    await back('13:00', { hours: 101.5 });
  });

  test('is kept between its neighbours for review, and the meter stays where it is', async () => {
    const late = await back('14:00', { hours: 101, at: new Date('2026-06-02T11:30:00Z') });
    expect(late).toMatchObject({ engineHours: 101, hoursRun: 0.5, review: 'late_arrival', outings: 3 });
    expect(await meter()).toMatchObject({ engine_hours_tenths: 1015, outing_count: 3 });
  });

  test.each([
    ['more than the next', 101.6],
    ['less than the one before', 100.4],
    ['so little that the next would have run more than the clock', 100.5, '2026-06-02T12:30:00Z'],
  ])('is refused when it shows %s', async (_, hours, time = '2026-06-02T11:30:00Z') => {
    await expect(back('14:00', { hours, at: new Date(time) })).rejects.toMatchObject({
      code: 'reading_refused',
      errors: [{ path: 'hours' }],
    });
  });

  test('cannot bring a new meter', async () => {
    const entry = {
      hours: 0,
      meterSwap: { oldFinal: 100.8, newFirst: 0 },
      at: new Date('2026-06-02T11:30:00Z'),
    };
    await expect(back('14:00', entry)).rejects.toMatchObject({ errors: [{ path: 'meterSwap' }] });
  });
});

describe('the same entry sent again', () => {
  test('answers with the first result and writes nothing, whatever came after', async () => {
    const gone = await out('10:00');
    const entry = { id: randomUUID(), hours: 3.2, meterSwap: { oldFinal: 100.6, newFirst: 3 } };
    const first = await back('11:00', { ...entry, defect: { title: 'Seat torn', holdsUnit: false } });
    await back('13:00', { hours: 4 });
    const before = await recordsOf(database.db);
    expect(await back('14:00', { ...entry, hours: 9 })).toEqual(first);
    expect(first.outingId).toBe(gone.id);
    expect(await recordsOf(database.db)).toEqual(before);
  });

  test('ten times at once is kept once, and all ten are answered alike', async () => {
    const id = randomUUID();
    const answers = await Promise.all(Array.from({ length: 10 }, () => back('11:00', { id, hours: 100.5 })));
    expect(new Set(answers.map((answer) => JSON.stringify(answer))).size).toBe(1);
    expect(await meter()).toMatchObject({ outing_count: 1, engine_hours_tenths: 1005 });
    expect(await readingCount()).toBe(2);
  });

  test('for another unit, or as another kind of entry, is refused', async () => {
    const { unit: other } = await openDock(database.db, { name: 'Cais Sul', fleetNumber: 'S-1' });
    const { id } = await back('11:00', { hours: 100.5 });
    const conflict = { code: 'conflict', errors: [{ path: 'id' }] };
    await expect(back('12:00', { id, unitId: other.id, hours: 100.5 })).rejects.toMatchObject(conflict);
    await expect(logReading(at('12:00'), { id, unitId, hours: 100.5 })).rejects.toMatchObject(conflict);
  });

  test('at once for two units is kept for one of them', async () => {
    const { unit: other } = await openDock(database.db, { name: 'Cais Sul', fleetNumber: 'S-1' });
    const id = randomUUID();
    const both = [unitId, other.id].map((unit) => back('11:00', { id, unitId: unit, hours: 100.5 }));
    const results = await Promise.allSettled(both);
    expect(results.map(({ status }) => status).sort()).toEqual(['fulfilled', 'rejected']);
    expect(await readingCount()).toBe(3);
  });
});

test('two entries of one unit at once are both judged by what the other left', async () => {
  const results = await Promise.all([back('11:00', { hours: 100.5 }), back('11:00', { hours: 100.5 })]);
  expect(results.map(({ outings }) => outings).sort()).toEqual([1, 2]);
  expect(results.map(({ hoursRun }) => hoursRun).sort()).toEqual([0, 0.5]);
  expect(await meter()).toMatchObject({ outing_count: 2, engine_hours_tenths: 1005 });
});

test('a reading without an outing is kept and counts none', async () => {
  const answer = await logReading(at('11:00'), { id: randomUUID(), unitId, hours: 100.3 });
  expect(answer).toMatchObject({ engineHours: 100.3, hoursRun: 0.3, review: null });
  expect(await meter()).toMatchObject({ outing_count: 0, engine_hours_tenths: 1003 });
});

async function readingCount(): Promise<number> {
  return (await database.db.selectFrom('reading').select('id').execute()).length;
}

async function jobsOf(task: string): Promise<(string | null)[]> {
  const rows = await database.db
    .withTables<{ 'graphile_worker.jobs': { task_identifier: string; key: string | null } }>()
    .selectFrom('graphile_worker.jobs')
    .select('key')
    .where('task_identifier', '=', task)
    .execute();
  return rows.map(({ key }) => key);
}
