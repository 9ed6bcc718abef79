import { parseCronItems } from 'graphile-worker';
import type { JobName } from '@/lib/schemas/jobs';

const QUARTER_HOUR_MS = 15 * 60_000;
const DAY_MS = 24 * 60 * 60_000;

/**
 * What runs by the clock, which is UTC. What depends on a dock's own time is ticked, and chosen by the job. A
 * worker that starts makes up for the last time that was missed within `madeUpMs`.
 */
export const TIMES: readonly { task: JobName; at: string; madeUpMs: number }[] = [
  { task: 'open-tasks', at: '*/15 * * * *', madeUpMs: QUARTER_HOUR_MS },
  { task: 'tick-digests', at: '*/15 * * * *', madeUpMs: QUARTER_HOUR_MS },
  { task: 'refresh-fleet', at: '10 2 * * *', madeUpMs: DAY_MS },
  { task: 'tidy', at: '40 2 * * *', madeUpMs: DAY_MS },
  { task: 'sweep-files', at: '50 2 * * *', madeUpMs: DAY_MS },
];

/** One job of a kind at a time: one that still waits when the next falls due is the same job. */
export const CRON_ITEMS = parseCronItems(
  TIMES.map(({ task, at, madeUpMs }) => ({
    task,
    match: at,
    identifier: task,
    options: { jobKey: `${task}:cron`, backfillPeriod: madeUpMs },
  })),
);
