import { EventEmitter } from 'node:events';
import { run, type WorkerEvents } from 'graphile-worker';
import { createDatabase, createPool } from '@/db/client';
import type { Context } from '@/lib/context';
import { workerLimits } from './limits';
import type { Env } from '@/lib/env';
import { CRON_ITEMS } from './crontab';
import { keepHeartbeat } from './heartbeat';
import { queueLogger } from './queue-logger';
import { TASKS } from './task-list';

/** How long running jobs may go on after the worker was asked to end; the launcher waits ten seconds. */
const GRACE_MS = 7_000;
/** Less than a dead worker's limit plus the lock time-out: a stopped one must not hold locks for longer. */
const IDLE_IN_TRANSACTION_MS = 10_000;

export type Worker = { workerId: string; ended: Promise<void>; stop(): Promise<void> };

/**
 * Starts taking jobs. `ended` settles when the worker has ended, and rejects when the queue gave up; `stop` lets
 * running jobs finish for seven seconds and puts back what has not. `onGone` as of keepHeartbeat.
 */
export async function startWorker(env: Env, onGone: (why: string) => void): Promise<Worker> {
  const limits = workerLimits(env.WORKER_BEAT_MS);
  const settings = {
    url: env.DATABASE_URL,
    applicationName: 'wakewright-worker',
    idleInTransactionTimeoutMs: IDLE_IN_TRANSACTION_MS,
  };
  const db = createDatabase({ ...settings, max: env.WORKER_CONCURRENCY + 2 });
  const pool = createPool({ ...settings, max: env.WORKER_CONCURRENCY + 2 });
  const ctx = (): Context => ({ db, actor: { kind: 'system' }, now: new Date() });

  const events: WorkerEvents = new EventEmitter();
  let workerId = '';
  events.once('pool:create', ({ workerPool }) => (workerId = workerPool.id));
  const runner = await run({
    pgPool: pool,
    concurrency: env.WORKER_CONCURRENCY,
    pollInterval: limits.pollMs,
    noHandleSignals: true,
    events,
    logger: queueLogger(env.LOG_LEVEL),
    taskList: Object.fromEntries(
      Object.entries(TASKS).map(([name, task]) => [name, (payload: unknown) => task(ctx(), payload, env)]),
    ),
    parsedCronItems: CRON_ITEMS,
    // Completions in batches are retried and waited for at the end; single ones are neither.
    preset: { worker: { completeJobBatchDelay: 0, failJobBatchDelay: 0 } },
  });
  const heartbeat = keepHeartbeat({ ctx, workerId, limits, onGone });
  const ended = runner.promise.finally(async () => {
    await heartbeat.stop();
    await Promise.all([pool.end(), db.destroy()]);
  });
  const stop = async () => {
    void runner.stop().catch(() => undefined);
    const inTime = await settlesWithin(ended, GRACE_MS);
    // Whatever still runs is given back, and ends with the process.
    if (!inTime) await heartbeat.stop();
  };
  return { workerId, ended, stop };
}

/** True when the promise settles within `ms`, either way. */
async function settlesWithin(promise: Promise<unknown>, ms: number): Promise<boolean> {
  let timer: NodeJS.Timeout | undefined;
  const late = new Promise<boolean>((resolve) => (timer = setTimeout(resolve, ms, false)));
  const settled = promise.then(
    () => true,
    () => true,
  );
  return Promise.race([settled, late]).finally(() => clearTimeout(timer));
}
