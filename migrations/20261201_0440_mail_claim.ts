import { sql, type Kysely } from 'kysely';

/**
 * Which run has a letter in hand, and which letter a week's digest became. `put_job` can put a job on a queue whose
 * jobs run one after the other.
 */
export async function up(db: Kysely<unknown>): Promise<void> {
  await sql`
    alter table mail add column claim_id uuid;
    alter table digest add column mail_id uuid references mail on delete set null;
    create index digest_mail on digest (mail_id);
    create index mail_recipient on mail (recipient, queued_at);

    drop function put_job(text, json, timestamptz, text);
    create function put_job(name text, payload json, run_at timestamptz, job_key text, queue_name text) returns void
    language plpgsql as $$
    begin
      for attempt in 1 .. 5 loop
        if (graphile_worker.add_job(
              put_job.name, put_job.payload, queue_name => put_job.queue_name, run_at => put_job.run_at,
              job_key => put_job.job_key)).id is not null then
          return;
        end if;
      end loop;
      raise exception 'job % was taken at every attempt to add it', put_job.name using errcode = '40001';
    end
    $$;
  `.execute(db);
}
