import { sql, type Kysely } from 'kysely';

/**
 * A reading may be logged without an outing. `put_job` adds a job for certain: `add_job` answers null, and adds
 * nothing, when a worker takes the job of that key at the same moment; a second call then finds the key free.
 */
export async function up(db: Kysely<unknown>): Promise<void> {
  await sql`
    alter table reading drop constraint reading_source_check;
    alter table reading add constraint reading_source_check check (
      source in ('entry', 'check_in', 'logged', 'swap_final', 'swap_first', 'closure', 'correction'));

    create function put_job(name text, payload json, run_at timestamptz, job_key text) returns void
    language plpgsql as $$
    begin
      for attempt in 1 .. 5 loop
        if (graphile_worker.add_job(
              put_job.name, put_job.payload, run_at => put_job.run_at, job_key => put_job.job_key)).id is not null then
          return;
        end if;
      end loop;
      raise exception 'job % was taken at every attempt to add it', put_job.name using errcode = '40001';
    end
    $$;
  `.execute(db);
}
