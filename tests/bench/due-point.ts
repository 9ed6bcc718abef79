import { randomUUID } from 'node:crypto';
import { sql } from 'kysely';
import pg from 'pg';
import { atMost, median, ms, percentile, type Figure } from './figures';
import type { Setting } from './setting';

const ROUNDS = 5;
const SAMPLES = 60;

/**
 * From the commit of a check-in to that of the task it opens, against the time from the commit of an empty job to
 * its start on the same worker. All instants are those at which one listener hears of the commits.
 */
export async function measureDuePoint(setting: Setting): Promise<Figure[]> {
  const { db, idle } = setting;
  await idle();
  await announce(setting);
  const ear = await listen(setting.url);
  const bodies = await listNearingCheckIns(setting);
  if (bodies.length < (ROUNDS + 1) * SAMPLES) throw new Error(`only ${bodies.length} units near a duty`);
  const rounds: { empty: number[]; due: number[] }[] = [];
  for (let round = -1; round < ROUNDS; round += 1) {
    const one: { empty: number[]; due: number[] } = { empty: [], due: [] };
    for (let sample = 0; sample < SAMPLES; sample += 1) {
      await idle();
      one.empty.push(await ear.between('jobs:insert', 'bench:started', () => enqueueEmptyJob(db)));
      await idle();
      const body = bodies.pop()!;
      one.due.push(await ear.between('jobs:insert', 'bench:opened', () => checkIn(setting, body)));
    }
    if (round >= 0) rounds.push(one);
  }
  await ear.stop();
  const figure = (name: string, share: number) => {
    const [empty, due] = [
      median(rounds.map((r) => percentile(r.empty, share))),
      median(rounds.map((r) => percentile(r.due, share))),
    ];
    return atMost(
      `check-in's commit to the opened task, ${name}, against an empty job's start`,
      median(rounds.map((r) => percentile(r.due, share) / percentile(r.empty, share))),
      2,
      `${ms(due)} to ${ms(empty)}`,
    );
  };
  return [figure('p50', 0.5), figure('p99', 0.99)];
}

/** Says, when the transaction commits, that a job was taken or a task opened. */
async function announce({ db }: Setting): Promise<void> {
  await sql`
    create function bench_say() returns trigger language plpgsql as $$
      begin perform pg_notify(tg_argv[0], ''); return null; end $$;
    create trigger bench_started after update of locked_at on graphile_worker._private_jobs
      for each row when (new.locked_at is not null and old.locked_at is null)
      execute function bench_say('bench:started');
    create trigger bench_opened after insert on task
      for each statement execute function bench_say('bench:opened')`.execute(db);
}

async function listen(url: string) {
  const client = new pg.Client({ connectionString: url });
  await client.connect();
  for (const channel of ['jobs:insert', 'bench:started', 'bench:opened'])
    await client.query(`listen ${client.escapeIdentifier(channel)}`);
  const next = (channel: string) =>
    new Promise<number>((resolve) => {
      const hear = (message: pg.Notification) => {
        if (message.channel !== channel) return;
        client.off('notification', hear);
        resolve(performance.now());
      };
      client.on('notification', hear);
    });
  return {
    between: async (from: string, to: string, work: () => Promise<unknown>) => {
      const heard = Promise.all([next(from), next(to)]);
      await work();
      const [began, ended] = await heard;
      return ended - began;
    },
    stop: () => client.end(),
  };
}

/** A letter that does not exist: the job looks for it and is done. */
async function enqueueEmptyJob(db: Setting['db']): Promise<void> {
  await sql`select graphile_worker.add_job('send-mail', ${JSON.stringify({ mailId: randomUUID() })}::json)`.execute(
    db,
  );
}

/** Check-ins that each bring one more duty of a unit within its lead, a unit each. */
async function listNearingCheckIns({ db }: Setting): Promise<string[]> {
  const { rows } = await sql<{ unit_id: string; read_at: Date; tenths: number }>`
    select m.unit_id, m.read_at, min(p.upcoming_from_tenths) as tenths
      from live_meter m join due_point p on p.unit_id = m.unit_id
     where p.upcoming_from_tenths between m.engine_hours_tenths + 1 and m.engine_hours_tenths + 75
       and not exists (select 1 from task t
         where t.unit_id = p.unit_id and t.rule_id = p.rule_id and t.ended_at is null)
     group by m.unit_id order by m.unit_id`.execute(db);
  return rows.map((row) =>
    JSON.stringify({
      id: randomUUID(),
      unitId: row.unit_id,
      hours: row.tenths / 10,
      at: new Date(row.read_at.getTime() + 9 * 3_600_000).toISOString(),
    }),
  );
}

async function checkIn({ app, cookie }: Setting, body: string): Promise<void> {
  const answer = await fetch(`${app.baseUrl}/api/v1/check-ins`, {
    method: 'POST',
    headers: { cookie: cookie.dock, 'content-type': 'application/json', origin: app.baseUrl },
    body,
  });
  if (answer.status !== 201) throw new Error(`a check-in was refused: ${await answer.text()}`);
  await answer.arrayBuffer();
}
