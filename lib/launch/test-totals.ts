import { z } from 'zod';

export interface Totals {
  passed: number;
  failed: number;
}

const vitestReport = z.object({
  numPassedTests: z.number(),
  numFailedTests: z.number(),
  numPendingTests: z.number(),
  numTodoTests: z.number(),
  success: z.boolean(),
});

const playwrightReport = z.object({
  stats: z.object({ expected: z.number(), unexpected: z.number(), flaky: z.number(), skipped: z.number() }),
  errors: z.array(z.unknown()),
});

/**
 * Counts a JSON report. A test that was skipped, or that passed at a second try, counts as failed; so does a run
 * that failed without a failed test (a file that does not load). Throws when it is no such report.
 */
export function countReport(kind: 'vitest' | 'playwright', text: string): Totals {
  if (kind === 'vitest') {
    const report = vitestReport.parse(JSON.parse(text));
    const failed = report.numFailedTests + report.numPendingTests + report.numTodoTests;
    return { passed: report.numPassedTests, failed: failed === 0 && !report.success ? 1 : failed };
  }
  const { stats, errors } = playwrightReport.parse(JSON.parse(text));
  const failed = stats.unexpected + stats.flaky + stats.skipped;
  return { passed: stats.expected, failed: failed === 0 && errors.length > 0 ? 1 : failed };
}

export const addTotals = (a: Totals, b: Totals): Totals => ({
  passed: a.passed + b.passed,
  failed: a.failed + b.failed,
});

/** The last line of `npm test`. */
export const totalsLine = ({ passed, failed }: Totals) => `${passed} passed, ${failed} failed`;
