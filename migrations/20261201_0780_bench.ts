import { sql, type Kysely } from 'kysely';

/**
 * Work at the bench: what was entered step by step, who is at a task, who signed for it, and the follow-ups that a
 * failed step opened. Entries are only ever added; the latest of a place and stage stands.
 */
export async function up(db: Kysely<unknown>): Promise<void> {
  await sql`
    alter table unit add column specs jsonb not null default '{}';
    alter table rule
      add column wants_second_person boolean not null default false,
      add column wants_test_ride boolean not null default false;

    create table step_entry (
      id uuid primary key default gen_random_uuid(),
      seq bigint not null generated always as identity unique,
      task_id uuid not null references task,
      unit_id uuid not null references unit,
      step_key text not null,
      place int not null check (place >= 0),
      stage text check (stage in ('found', 'left')),
      value jsonb not null,
      spec text,
      judged jsonb,
      engine_hours_tenths int not null,
      follows_id uuid references step_entry,
      entered_at timestamptz not null,
      entered_by uuid references person,
      recorded_at timestamptz not null
    );
    create index step_entry_task on step_entry (task_id, seq);
    create index step_entry_spec on step_entry (unit_id, spec, seq) where spec is not null;

    alter table task
      add column only_per text check (only_per in ('engine', 'cylinder', 'carb')),
      add column only_place int check (only_place >= 1),
      add column step_entry_id uuid references step_entry,
      add column wants_second_person boolean not null default false,
      add column wants_test_ride boolean not null default false,
      add check ((only_per is null) = (only_place is null));
    alter table defect add column step_entry_id uuid references step_entry;
    create index task_step_entry on task (step_entry_id) where step_entry_id is not null;
    create index defect_step_entry on defect (step_entry_id) where step_entry_id is not null;

    alter table closure add column sign_offs jsonb not null default '[]';

    create table task_presence (
      task_id uuid not null references task,
      person_id uuid not null references person,
      seen_at timestamptz not null,
      primary key (task_id, person_id)
    );

    create table sign_off (
      id uuid primary key,
      task_id uuid not null references task,
      kind text not null check (kind in ('second_person', 'test_ride')),
      note text,
      last_entry_seq bigint not null,
      signed_at timestamptz not null,
      signed_by uuid not null references person,
      withdrawn_at timestamptz,
      withdrawn_by uuid references person
    );
    create unique index sign_off_standing on sign_off (task_id, kind) where withdrawn_at is null;
  `.execute(db);
}
