import { sql, type Kysely } from 'kysely';
import type { DB } from '../tables';

/*
 * Whether a worker lives is asked of the database's clock and of no other: it is the only one that the workers of
 * several machines share.
 */

/** Records that a worker lives. Answers false, and writes nothing, when it was taken for dead in the meantime. */
export async function replaceHeartbeat(db: Kysely<DB>, workerId: string): Promise<boolean> {
  const { numAffectedRows } = await sql`
    insert into worker_heartbeat as h (worker_id, started_at, beat_at)
    values (${workerId}, clock_timestamp(), clock_timestamp())
    on conflict (worker_id) do update set beat_at = excluded.beat_at where h.stopped_at is null`.execute(db);
  return numAffectedRows === 1n;
}

/** Records that a worker ended, and gives back whatever it still had. */
export async function insertWorkerEnd(db: Kysely<DB>, workerId: string): Promise<void> {
  await sql`update worker_heartbeat set stopped_at = clock_timestamp()
    where worker_id = ${workerId} and stopped_at is null`.execute(db);
  await sql`select graphile_worker.force_unlock_workers(array[${workerId}]::text[])`.execute(db);
}

/**
 * Takes for dead every worker whose last beat is more than `goneAfterMs` old, and puts the jobs of all that are
 * not alive back on the queue. Answers whose. While the server itself has not been up for so long nobody is taken
 * for dead: they had no chance to beat.
 */
export async function freeJobsOfGoneWorkers(db: Kysely<DB>, goneAfterMs: number): Promise<string[]> {
  const limit = sql`clock_timestamp() - ${goneAfterMs} * interval '1 millisecond'`;
  const { rows } = await sql<{ worker_id: string }>`
    with gone as (
      update worker_heartbeat set stopped_at = clock_timestamp()
       where stopped_at is null and beat_at < ${limit} and pg_postmaster_start_time() < ${limit}
      returning worker_id
    ), holding as (
      select locked_by as worker_id from graphile_worker.jobs
       where locked_at < ${limit}
         and not exists (select 1 from worker_heartbeat h where h.worker_id = locked_by and h.stopped_at is null)
      union
      select worker_id from gone
    )
    select worker_id, graphile_worker.force_unlock_workers(array[worker_id]) from holding`.execute(db);
  return rows.map((row) => row.worker_id);
}

/**
 * How the queue stands: workers that live, and for how many seconds the job that waits longest could have run. A
 * job that a worker has which no longer lives counts as waiting; one that failed for good does not.
 */
export async function getQueueStatus(
  db: Kysely<DB>,
  goneAfterMs: number,
): Promise<{ workers: number; lagSeconds: number }> {
  const { rows } = await sql<{ workers: number; lag: number }>`
    with live as (
      select worker_id from worker_heartbeat
       where stopped_at is null and beat_at >= clock_timestamp() - ${goneAfterMs} * interval '1 millisecond'
    )
    select (select count(*)::int from live) as workers,
           (select coalesce(extract(epoch from clock_timestamp() - min(run_at)), 0)::float8
              from graphile_worker.jobs
             where run_at <= clock_timestamp()
               and (locked_by is null or not exists (select 1 from live where worker_id = locked_by))
               and (attempts < max_attempts or locked_by is not null)) as lag`.execute(db);
  const { workers, lag } = rows[0]!;
  return { workers, lagSeconds: Math.round(lag * 10) / 10 };
}
