/** One line of the table: what was measured, what is aimed at, and whether it was reached. */
export interface Figure {
  what: string;
  measured: string;
  target: string;
  reached: boolean;
}

/** The middle value, or the mean of the two in the middle. Throws when there is none. */
export function median(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  const middle = Math.floor(sorted.length / 2);
  const [below, above] = [sorted[sorted.length % 2 ? middle : middle - 1], sorted[middle]];
  if (below === undefined || above === undefined) throw new RangeError('nothing was measured');
  return (below + above) / 2;
}

/** The smallest value that at least `share` (0 to 1) of the values do not exceed. */
export function percentile(values: readonly number[], share: number): number {
  const sorted = [...values].sort((a, b) => a - b);
  const value = sorted[Math.max(0, Math.ceil(share * sorted.length) - 1)];
  if (value === undefined) throw new RangeError('nothing was measured');
  return value;
}

/** Milliseconds that `work` takes. */
export async function timed(work: () => unknown): Promise<number> {
  const began = performance.now();
  await work();
  return performance.now() - began;
}

export const ms = (value: number) => `${value < 10 ? value.toFixed(2) : Math.round(value)} ms`;
export const times = (value: number) => `${value.toFixed(2)}×`;

/** A figure that must not exceed `limit`. */
export function atMost(what: string, value: number, limit: number, detail = ''): Figure {
  return {
    what,
    measured: detail ? `${times(value)} (${detail})` : times(value),
    target: `≤ ${limit}×`,
    reached: value <= limit,
  };
}

/** A figure that must reach `limit`. */
export function atLeast(what: string, value: number, limit: number, detail = ''): Figure {
  return {
    what,
    measured: detail ? `${times(value)} (${detail})` : times(value),
    target: `≥ ${limit}×`,
    reached: value >= limit,
  };
}

/** The figures as a Markdown table. */
export function toTable(figures: readonly Figure[]): string {
  const rows = figures.map(({ what, measured, target, reached }) => [
    what,
    measured,
    target,
    reached ? 'reached' : 'not reached',
  ]);
  return [['what', 'measured', 'target', ''], ['---', '---', '---', '---'], ...rows]
    .map((row) => `| ${row.join(' | ')} |`)
    .join('\n');
}
