import { randomUUID } from 'node:crypto';
import { beforeEach, describe, expect, test } from 'vitest';
import { checkIn } from '@/lib/actions/check-in';
import { checkOut } from '@/lib/actions/check-out';
import { getAvailability } from '@/lib/actions/get-availability';
import { listReadings } from '@/lib/actions/list-readings';
import { logReading } from '@/lib/actions/log-reading';
import { reviewReading } from '@/lib/actions/review-reading';
import { voidReading } from '@/lib/actions/void-reading';
import type { CreateCheckIn } from '@/lib/schemas/check-in';
import { recordsOf } from '../support/bad-input';
import { asSystem, openDock } from '../support/crew';
import { testDatabase } from '../support/database';

const database = testDatabase();
let unitId: string;

const at = (time: string) => asSystem(database.db, `2026-06-02T${time}:00Z`);
const back = (time: string, hours: number, entry: Partial<CreateCheckIn> = {}) =>
  checkIn(at(time), { id: randomUUID(), unitId, hours, ...entry });
const meter = () =>
  database.db
    .selectFrom('live_meter')
    .select(['engine_hours_tenths', 'shown_tenths', 'base_tenths', 'outing_count', 'read_at'])
    .where('unit_id', '=', unitId)
    .executeTakeFirstOrThrow();
const readings = async () => (await listReadings(at('20:00'), { unitId })).items;

beforeEach(async () => {
  ({
    unit: { id: unitId },
  } = await openDock(database.db, { holdsAt: 105 }));
});

describe('a mistaken reading', () => {
  test('is voided and replaced, both are kept, and a unit it held is ready at once', async () => {
    const wrong = await back('11:00', 105.5, { confirmReason: 'Read twice' });
    expect((await getAvailability(at('11:01'), {})).held).toHaveLength(1);
    const voided = await voidReading(at('12:00'), wrong.id, {
      reason: 'A 5 read for a 0',
      replacement: { hours: 100.5 },
    });
    expect(voided).toMatchObject({ engineHours: 100.5, outings: 1 });
    expect(await meter()).toMatchObject({
      engine_hours_tenths: 1005,
      read_at: new Date('2026-06-02T11:00:00Z'),
    });
    expect((await getAvailability(at('12:01'), {})).ready).toMatchObject([{ hoursToHold: 4.5 }]);
    expect(await readings()).toEqual(
      expect.arrayContaining([
        expect.objectContaining({ id: wrong.id, voidReason: 'A 5 read for a 0', engineHours: 105.5 }),
        expect.objectContaining({
          id: voided.replacementId,
          replacesReadingId: wrong.id,
          source: 'correction',
          at: '2026-06-02T11:00:00.000Z',
          voidedAt: null,
        }),
      ]) as unknown,
    );
  });

  test('without another in its place leaves the reading before it, and the outing counted', async () => {
    const { id } = await back('11:00', 101);
    await voidReading(at('12:00'), id, { reason: 'Wrong unit’s meter' });
    expect(await meter()).toMatchObject({ engine_hours_tenths: 1000, outing_count: 1 });
  });

  test('of an outing that never happened takes the outing with it', async () => {
    await checkOut(at('10:00'), { id: randomUUID(), unitId });
    const { id } = await back('11:00', 101);
    await voidReading(at('12:00'), id, { reason: 'Wrong unit', outingHappened: false });
    expect(await meter()).toMatchObject({ engine_hours_tenths: 1000, outing_count: 0 });
  });

  test('leaves the meter, of two alike before it, at the one that was recorded last', async () => {
    const taken = { at: new Date('2026-06-02T11:00:00Z') };
    await back('11:00', 100.5, taken);
    const second = await logReading(at('11:30'), { id: randomUUID(), unitId, hours: 100.5, ...taken });
    const wrong = await back('12:00', 101.5);
    await voidReading(at('12:05'), wrong.id, { reason: 'Another unit’s meter' });
    const { reading_id } = await database.db
      .selectFrom('live_meter')
      .select('reading_id')
      .where('unit_id', '=', unitId)
      .executeTakeFirstOrThrow();
    expect(reading_id).toBe(second.id);
  });

  test('in the middle leaves the meter where the last reading put it', async () => {
    const { id } = await back('11:00', 101);
    await back('13:00', 102);
    await voidReading(at('14:00'), id, { reason: 'Misread', replacement: { hours: 100.9 } });
    expect(await meter()).toMatchObject({ engine_hours_tenths: 1020, outing_count: 2 });
  });

  test('sent again still answers with its first result, and writes nothing', async () => {
    const first = await back('11:00', 101);
    await voidReading(at('12:00'), first.id, { reason: 'Misread' });
    const before = await recordsOf(database.db);
    expect(await back('13:00', 101, { id: first.id })).toMatchObject({ id: first.id, engineHours: 101 });
    expect(await recordsOf(database.db)).toEqual(before);
  });
});

describe('voiding is refused, nothing changed', () => {
  const refusal = async (id: string, input: Parameters<typeof voidReading>[2]) => {
    const before = await recordsOf(database.db);
    const error: unknown = await voidReading(at('15:00'), id, input).catch((thrown: unknown) => thrown);
    expect(await recordsOf(database.db)).toEqual(before);
    return error;
  };

  test('when a replacement does not fit between its neighbours', async () => {
    const { id } = await back('11:00', 101);
    await back('13:00', 102);
    for (const hours of [99.9, 102.1])
      expect(await refusal(id, { reason: 'Misread', replacement: { hours } })).toMatchObject({
        code: 'reading_refused',
        errors: [{ path: 'replacement.hours' }],
      });
  });

  test('of the first reading, unless another takes its place', async () => {
    const entry = (await readings()).find(({ source }) => source === 'entry')!;
    expect(await refusal(entry.id, { reason: 'Misread' })).toMatchObject({
      errors: [{ path: 'replacement' }],
    });
    await voidReading(at('15:00'), entry.id, { reason: 'Misread', replacement: { hours: 99 } });
    expect(await meter()).toMatchObject({ engine_hours_tenths: 990 });
  });

  test('twice', async () => {
    const { id } = await back('11:00', 101);
    await voidReading(at('12:00'), id, { reason: 'Misread' });
    expect(await refusal(id, { reason: 'Again' })).toMatchObject({
      code: 'conflict',
      errors: [{ path: 'id' }],
    });
  });

  test('when it says that no outing happened, and none ended with the reading', async () => {
    const { id } = await logReading(at('11:00'), { id: randomUUID(), unitId, hours: 100.2 });
    expect(await refusal(id, { reason: 'Misread', outingHappened: false })).toMatchObject({
      errors: [{ path: 'outingHappened' }],
    });
  });
});

describe('a meter swap declared by mistake', () => {
  test('is voided as a pair once no reading on the new meter is left, and logged anew', async () => {
    const checkedIn = await back('11:00', 0.4, { meterSwap: { oldFinal: 100.5, newFirst: 0 } });
    const first = (await readings()).find(({ source }) => source === 'swap_first')!;
    await expect(voidReading(at('12:00'), first.id, { reason: 'No swap' })).rejects.toMatchObject({
      code: 'conflict',
      errors: [{ path: 'id', message: expect.stringContaining('0.4 h') as string }],
    });
    await voidReading(at('12:00'), checkedIn.id, { reason: 'No swap' });
    await voidReading(at('12:01'), first.id, { reason: 'No swap' });
    expect(await meter()).toMatchObject({ engine_hours_tenths: 1000, base_tenths: 0 });
    expect(await logReading(at('12:02'), { id: randomUUID(), unitId, hours: 100.9 })).toMatchObject({
      engineHours: 100.9,
    });
  });
});

describe('a reading kept for review', () => {
  test('waits until a manager accepts it with a note, once', async () => {
    await checkOut(at('10:30'), { id: randomUUID(), unitId });
    const { id } = await back('11:00', 102, { confirmReason: 'Ran on the hose' });
    const waiting = await listReadings(at('12:00'), { review: 'open' });
    expect(waiting.items).toMatchObject([
      { id, review: 'unusual_jump', confirmReason: 'Ran on the hose', previous: { engineHours: 100 } },
    ]);
    // Later ones that wait for nobody are not in the way of the page.
    await back('11:20', 102.1);
    await back('11:40', 102.2);
    const one = await listReadings(at('12:00'), { unitId, review: 'open', limit: 1 });
    expect(one.items.map((reading) => reading.id)).toEqual([id]);
    await reviewReading(at('12:00'), id, { note: 'Right' });
    expect((await listReadings(at('12:00'), { review: 'open' })).items).toEqual([]);
    await expect(reviewReading(at('12:00'), id, {})).rejects.toMatchObject({ code: 'conflict' });
  });
});

test('a unit’s readings come in pages, the latest first, each once', async () => {
  for (const [time, hours] of [
    ['10:00', 100.2],
    ['11:00', 100.4],
    ['12:00', 100.6],
  ] as const)
    await back(time, hours);
  const shown: number[] = [];
  let cursor: string | undefined;
  do {
    const page = await listReadings(at('13:00'), { unitId, limit: 1, cursor });
    shown.push(...page.items.map(({ shownHours }) => shownHours));
    cursor = page.nextCursor ?? undefined;
  } while (cursor);
  expect(shown).toEqual([100.6, 100.4, 100.2, 100]);
});
