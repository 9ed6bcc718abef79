import { expect, test } from 'vitest';
import { addTotals, countReport, totalsLine } from '@/lib/launch/test-totals';

const vitest = (counts: object) =>
  JSON.stringify({
    numPassedTests: 5,
    numFailedTests: 0,
    numPendingTests: 0,
    numTodoTests: 0,
    success: true,
    ...counts,
  });
const playwright = (stats: object, errors: unknown[] = []) =>
  JSON.stringify({ stats: { expected: 3, unexpected: 0, flaky: 0, skipped: 0, ...stats }, errors });

test('passed tests of both kinds add up', () => {
  const sum = addTotals(countReport('vitest', vitest({})), countReport('playwright', playwright({})));
  expect(totalsLine(sum)).toBe('8 passed, 0 failed');
});

test.each([
  ['a failed test', 'vitest', vitest({ numFailedTests: 1, success: false })],
  ['a skipped test', 'vitest', vitest({ numPendingTests: 1 })],
  ['a file that does not load', 'vitest', vitest({ success: false })],
  ['a test that fails in the browser', 'playwright', playwright({ unexpected: 1 })],
  ['one that passes at a second try', 'playwright', playwright({ flaky: 1 })],
  ['one that is skipped', 'playwright', playwright({ skipped: 1 })],
  ['a set-up that fails', 'playwright', playwright({}, [{ message: 'no server' }])],
] as const)('%s counts as failed', (_, kind, text) => {
  expect(countReport(kind, text).failed).toBe(1);
});
