import { z } from 'zod';

/** How the worker stands. `lagSeconds`: for how long the job that waits longest could have run, 0 when none waits. */
export const workerStatus = z.object({ lagSeconds: z.number(), alive: z.boolean(), workers: z.int() });

export const health = z.object({ status: z.literal('up') });

export const readiness = z.object({
  database: z.literal('reached'),
  migrations: z.literal('current'),
  worker: workerStatus,
});

export type WorkerStatus = z.output<typeof workerStatus>;
export type Readiness = z.output<typeof readiness>;
