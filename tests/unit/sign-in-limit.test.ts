import { describe, expect, test } from 'vitest';
import { computeWaitMs, countedAddress, SIGN_IN_LADDERS, type Ladder } from '@/lib/domain/sign-in-limit';

const now = new Date('2026-07-04T10:00:00Z');
const MINUTE = 60_000;
const HOUR = 60 * MINUTE;
const ago = (ms: number) => new Date(now.getTime() - ms);
/** `count` failures, the latest `latest` ms ago and the others a second apart before it. */
const failures = (count: number, latest = 0) =>
  Array.from({ length: count }, (_, index) => ago(latest + index * 1000));

const ladder: Ladder = { windowMs: 24 * HOUR, free: 5, firstWaitMs: MINUTE, longestWaitMs: HOUR };

describe('how long somebody who guesses has to wait', () => {
  test('nobody waits without a failure, nor after four', () => {
    expect(computeWaitMs(ladder, [], now)).toBe(0);
    expect(computeWaitMs(ladder, failures(4), now)).toBe(0);
  });

  // Worked by hand: 1 min doubled with each failure beyond the fifth, at most 60 min.
  test.each([
    [5, 1],
    [6, 2],
    [7, 4],
    [8, 8],
    [9, 16],
    [10, 32],
    [11, 60],
    [40, 60],
  ])('after %i failures the wait is %i min', (count, minutes) => {
    expect(computeWaitMs(ladder, failures(count), now)).toBe(minutes * MINUTE);
  });

  test('the wait runs from the latest failure and is over at exactly its end', () => {
    expect(computeWaitMs(ladder, failures(5, 20_000), now)).toBe(40_000);
    expect(computeWaitMs(ladder, failures(5, MINUTE - 1), now)).toBe(1);
    expect(computeWaitMs(ladder, failures(5, MINUTE), now)).toBe(0);
  });

  test('a failure leaves the window at exactly its length', () => {
    const four = failures(4);
    expect(computeWaitMs(ladder, [...four, ago(24 * HOUR - 1)], now)).toBeGreaterThan(0);
    expect(computeWaitMs(ladder, [...four, ago(24 * HOUR)], now)).toBe(0);
  });

  test('the order in which failures are listed does not matter', () => {
    const list = failures(7, 5_000);
    expect(computeWaitMs(ladder, [...list].reverse(), now)).toBe(computeWaitMs(ladder, list, now));
  });

  test('an account gives away about thirty guesses a day at most', () => {
    const made: Date[] = [];
    for (let at = 0; at < 24 * HOUR; at += MINUTE) {
      const instant = new Date(now.getTime() + at);
      while (computeWaitMs(SIGN_IN_LADDERS.account, made, instant) === 0) made.push(instant);
    }
    // By hand: 5 at once, then after 1, 2, 4, 8, 16 and 32 min (63 min in all), then one an hour for 22 h 57 min.
    expect(made).toHaveLength(5 + 6 + 22);
  });
});

describe('which addresses are counted as one', () => {
  test.each([
    ['203.0.113.7', '203.0.113.7'],
    ['::ffff:203.0.113.7', '203.0.113.7'],
    ['2001:db8:1:2:3:4:5:6', '2001:db8:1:2::/64'],
    ['2001:0db8:0001:0002::9', '2001:db8:1:2::/64'],
    ['2001:db8::1', '2001:db8:0:0::/64'],
    ['::1', '0:0:0:0::/64'],
    ['fe80::1%eth0', 'fe80:0:0:0::/64'],
  ])('%s counts as %s', (address, counted) => {
    expect(countedAddress(address)).toBe(counted);
  });
});
