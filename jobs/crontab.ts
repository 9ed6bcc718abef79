import { parseCronItems } from 'graphile-worker';
import type { JobName } from '@/lib/schemas/jobs';

/** What runs by the clock, which is UTC. What depends on a dock's own time is ticked, and chosen by the job. */
const TIMES: { task: JobName; at: string }[] = [{ task: 'open-tasks', at: '*/15 * * * *' }];

/** One job of a kind at a time: one that still waits when the next falls due is the same job. */
export const CRON_ITEMS = parseCronItems(
  TIMES.map(({ task, at }) => ({
    task,
    match: at,
    identifier: task,
    options: { jobKey: `${task}:cron`, backfillPeriod: 0 },
  })),
);
