import { expect, test } from 'vitest';
import { currentWeek, digestWeekToSend, mondayOf } from '@/lib/domain/digest-week';

// Worked by hand. Mon 30 Nov 2026: 06:00 in New York (UTC-5) is 11:00Z, in Lisbon (UTC) 06:00Z.

const toSend = (zones: string[], at: string) => digestWeekToSend(zones, new Date(at));
const NEW_YORK = 'America/New_York';
const LISBON = 'Europe/Lisbon';

test('a week begins on Monday', () => {
  expect(mondayOf('2026-11-30')).toBe('2026-11-30');
  expect(mondayOf('2026-12-06')).toBe('2026-11-30');
});

test('a digest is sent from 06:00 on Monday to the end of Tuesday by the dock’s clock', () => {
  expect(toSend([NEW_YORK], '2026-11-30T10:59:59Z')).toBeNull();
  expect(toSend([NEW_YORK], '2026-11-30T11:00:00Z')).toBe('2026-11-30');
  expect(toSend([NEW_YORK], '2026-12-02T04:59:59Z')).toBe('2026-11-30');
  expect(toSend([NEW_YORK], '2026-12-02T05:00:00Z')).toBeNull();
  expect(toSend([NEW_YORK], '2026-11-29T20:00:00Z')).toBeNull();
});

test('with docks in two time zones it waits for the last and ends with the first', () => {
  expect(toSend([NEW_YORK, LISBON], '2026-11-30T10:59:00Z')).toBeNull();
  expect(toSend([NEW_YORK, LISBON], '2026-11-30T11:00:00Z')).toBe('2026-11-30');
  expect(toSend([NEW_YORK, LISBON], '2026-12-01T23:59:00Z')).toBe('2026-11-30');
  expect(toSend([NEW_YORK, LISBON], '2026-12-02T00:00:00Z')).toBeNull();
});

test('the ends of the world share some hours of it', () => {
  // 06:00 on Monday at UTC-11 is 17:00Z; Tuesday ends at UTC+14 at 10:00Z.
  const ends = ['Pacific/Pago_Pago', 'Pacific/Kiritimati'];
  expect(toSend(ends, '2026-11-30T16:59:00Z')).toBeNull();
  expect(toSend(ends, '2026-11-30T17:00:00Z')).toBe('2026-11-30');
  expect(toSend(ends, '2026-12-01T09:59:00Z')).toBe('2026-11-30');
  expect(toSend(ends, '2026-12-01T10:00:00Z')).toBeNull();
});

test('06:00 is 06:00 after both changes of the clock', () => {
  // New York: UTC-4 from Sun 8 Mar 2026, UTC-5 from Sun 1 Nov 2026.
  expect(toSend([NEW_YORK], '2026-03-09T09:59:00Z')).toBeNull();
  expect(toSend([NEW_YORK], '2026-03-09T10:00:00Z')).toBe('2026-03-09');
  expect(toSend([NEW_YORK], '2026-11-02T10:59:00Z')).toBeNull();
  expect(toSend([NEW_YORK], '2026-11-02T11:00:00Z')).toBe('2026-11-02');
});

test('nobody without a dock gets one', () => {
  expect(toSend([], '2026-11-30T12:00:00Z')).toBeNull();
});

test('this week is that of the last dock to begin it', () => {
  // 02:00Z on Monday is still Sunday in New York.
  expect(currentWeek([NEW_YORK, LISBON], new Date('2026-11-30T02:00:00Z'))).toBe('2026-11-23');
  expect(currentWeek([LISBON], new Date('2026-11-30T02:00:00Z'))).toBe('2026-11-30');
});
