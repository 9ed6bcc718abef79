import { sql, type Kysely } from 'kysely';

/**
 * The spine: docks, models, units and what happens to them.
 *
 * Facts (readings, outings, closures, baselines, defects, lay-ups) are kept; a mistake is voided or
 * reversed with who, when and why. Only due *points* are derived and stored. Units of measure end a name:
 * `_tenths` are tenths of an engine hour, `_on` is a calendar day, `_at` an instant.
 */
export async function up(db: Kysely<unknown>): Promise<void> {
  await sql`
    create table operator (
      id uuid primary key default gen_random_uuid(),
      only_one boolean not null default true unique check (only_one),
      name text not null,
      created_at timestamptz not null default now()
    );

    create table dock (
      id uuid primary key default gen_random_uuid(),
      name text not null,
      time_zone text not null,
      season_from text,
      season_to text,
      open_weekdays text[] not null default '{MO,TU,WE,TH,FR,SA,SU}',
      craft_numbers text not null default 'us' check (craft_numbers in ('us', 'other')),
      created_at timestamptz not null default now(),
      check ((season_from is null) = (season_to is null))
    );
    create unique index dock_name on dock (lower(name));

    create table model (
      id uuid primary key default gen_random_uuid(),
      name text not null,
      propulsion text not null check (propulsion in ('jet', 'outboard', 'inboard', 'electric')),
      stroke text check (stroke in ('two', 'four')),
      engines int not null,
      cylinders int not null,
      carb_count int not null,
      specs jsonb not null default '{}',
      created_at timestamptz not null default now()
    );
    create unique index model_name on model (lower(name));

    create table person (
      id uuid primary key default gen_random_uuid(),
      email text not null,
      name text not null,
      role text not null check (role in ('manager', 'mechanic', 'dock')),
      dock_ids uuid[] not null default '{}',
      password_hash text,
      session_version int not null default 1,
      digest_wanted boolean not null default false,
      unsubscribe_key uuid not null default gen_random_uuid() unique,
      created_at timestamptz not null default now(),
      deactivated_at timestamptz,
      deactivated_by uuid references person
    );
    create unique index person_email on person (lower(email));

    create table session (
      id uuid primary key default gen_random_uuid(),
      person_id uuid not null references person,
      session_version int not null,
      created_at timestamptz not null default now(),
      expires_at timestamptz not null,
      ended_at timestamptz
    );
    create index session_person on session (person_id);

    create table known_device (
      id uuid primary key default gen_random_uuid(),
      person_id uuid not null references person,
      token_hash bytea not null unique,
      created_at timestamptz not null default now(),
      expires_at timestamptz not null
    );

    create table sign_in_attempt (
      id bigint generated always as identity primary key,
      email_key text not null,
      address text not null,
      device_id uuid references known_device,
      succeeded boolean not null,
      attempted_at timestamptz not null default now()
    );
    create index sign_in_attempt_email on sign_in_attempt (email_key, attempted_at);
    create index sign_in_attempt_address on sign_in_attempt (address, attempted_at);

    create table invitation (
      id uuid primary key default gen_random_uuid(),
      email text not null,
      name text not null,
      role text not null check (role in ('manager', 'mechanic', 'dock')),
      dock_ids uuid[] not null default '{}',
      token_hash bytea not null unique,
      invited_by uuid not null references person,
      invited_at timestamptz not null default now(),
      expires_at timestamptz not null,
      accepted_at timestamptz,
      withdrawn_at timestamptz
    );
    create unique index invitation_open on invitation (lower(email)) where accepted_at is null and withdrawn_at is null;

    create table password_reset (
      id uuid primary key default gen_random_uuid(),
      person_id uuid not null references person,
      token_hash bytea not null unique,
      asked_at timestamptz not null default now(),
      expires_at timestamptz not null,
      used_at timestamptz
    );

    create table api_key (
      id uuid primary key default gen_random_uuid(),
      person_id uuid not null references person,
      name text not null,
      prefix text not null,
      key_hash bytea not null unique,
      created_at timestamptz not null default now(),
      last_used_at timestamptz,
      revoked_at timestamptz
    );

    create table unit (
      id uuid primary key default gen_random_uuid(),
      fleet_number text not null,
      model_id uuid not null references model,
      dock_id uuid not null references dock,
      hin text,
      registration text,
      entered_service_on date not null,
      carb_count_override int,
      created_at timestamptz not null default now(),
      created_by uuid references person,
      retired_at timestamptz,
      retired_by uuid references person
    );
    create unique index unit_fleet_number on unit (lower(fleet_number));
    create unique index unit_hin on unit (hin) where hin is not null and retired_at is null;
    create index unit_dock on unit (dock_id);
    create index unit_model on unit (model_id);

    create table outing (
      id uuid primary key,
      unit_id uuid not null references unit,
      dock_id uuid not null references dock,
      started_at timestamptz,
      checked_out_by uuid references person,
      due_back_at timestamptz,
      planned_tenths int,
      renter_reference text,
      ended_at timestamptz,
      checked_in_by uuid references person,
      ended_dock_id uuid references dock,
      voided_at timestamptz,
      voided_by uuid references person,
      void_reason text
    );
    create unique index outing_open on outing (unit_id) where ended_at is null and voided_at is null;
    create index outing_unit on outing (unit_id, ended_at) where voided_at is null;

    create table reading (
      id uuid primary key default gen_random_uuid(),
      unit_id uuid not null references unit,
      taken_at timestamptz not null,
      shown_tenths int not null check (shown_tenths >= 0),
      base_tenths int not null,
      engine_hours_tenths int not null generated always as (shown_tenths + base_tenths) stored,
      source text not null check (source in ('entry', 'check_in', 'swap_final', 'swap_first', 'closure', 'correction')),
      outing_id uuid references outing,
      recorded_at timestamptz not null default now(),
      recorded_by uuid references person,
      confirm_reason text,
      review_code text check (review_code in ('unusual_jump', 'late_arrival')),
      reviewed_at timestamptz,
      reviewed_by uuid references person,
      review_note text,
      voided_at timestamptz,
      voided_by uuid references person,
      void_reason text,
      replaces_reading_id uuid references reading
    );
    create index reading_unit_taken on reading (unit_id, taken_at desc, engine_hours_tenths desc) where voided_at is null;
    create index reading_unit_hours on reading (unit_id, engine_hours_tenths, taken_at) where voided_at is null;
    create index reading_outing on reading (outing_id);
    create index reading_to_review on reading (unit_id) where review_code is not null and reviewed_at is null and voided_at is null;

    create table live_meter (
      unit_id uuid primary key references unit,
      revision bigint not null default 0,
      reading_id uuid,
      read_at timestamptz not null,
      base_tenths int not null,
      shown_tenths int not null,
      engine_hours_tenths int not null,
      starting_outings int not null default 0,
      outing_count int not null
    ) with (fillfactor = 70);

    create table rule (
      id uuid primary key default gen_random_uuid(),
      name text not null,
      kind text not null check (kind in ('inspection', 'service', 'rebuild')),
      scope jsonb not null default '{}',
      triggers jsonb not null,
      lead jsonb not null,
      tolerance jsonb not null,
      holds_unit boolean not null,
      labour jsonb not null,
      parts jsonb not null default '[]',
      procedure_id uuid,
      revision int not null default 1,
      created_at timestamptz not null default now(),
      created_by uuid references person,
      changed_at timestamptz not null default now(),
      changed_by uuid references person,
      ended_at timestamptz,
      ended_by uuid references person
    );
    create unique index rule_name on rule (lower(name)) where ended_at is null;

    create table assessment (
      unit_id uuid primary key references unit,
      wanted_revision bigint not null default 1,
      assessed_revision bigint not null default 0,
      assessed_at timestamptz
    ) with (fillfactor = 70);
    create index assessment_behind on assessment (unit_id) where assessed_revision < wanted_revision;

    create table due_point (
      unit_id uuid not null references unit,
      rule_id uuid not null references rule,
      trigger_index smallint not null,
      due_tenths int, upcoming_from_tenths int, overdue_from_tenths int,
      due_outings int, upcoming_from_outings int, overdue_from_outings int,
      due_on date, upcoming_from_on date, overdue_from_on date,
      primary key (unit_id, rule_id, trigger_index),
      check (num_nonnulls(due_tenths, due_outings, due_on) = 1)
    ) with (fillfactor = 70);
    create index due_point_rule on due_point (rule_id);

    create table defect (
      id uuid primary key default gen_random_uuid(),
      unit_id uuid not null references unit,
      title text not null,
      detail text,
      holds_unit boolean not null,
      reported_at timestamptz not null,
      reported_by uuid references person,
      reading_id uuid references reading,
      cleared_at timestamptz,
      cleared_by uuid references person,
      clear_note text
    );
    create index defect_open on defect (unit_id) where cleared_at is null;

    create table lay_up (
      id uuid primary key default gen_random_uuid(),
      unit_id uuid not null references unit,
      from_on date not null,
      until_on date,
      reason text not null,
      recorded_at timestamptz not null default now(),
      recorded_by uuid references person,
      ended_at timestamptz,
      ended_by uuid references person
    );
    create index lay_up_unit on lay_up (unit_id) where ended_at is null;
    create unique index lay_up_open on lay_up (unit_id) where ended_at is null;

    create table task (
      id uuid primary key default gen_random_uuid(),
      unit_id uuid not null references unit,
      kind text not null check (kind in ('inspection', 'service', 'rebuild', 'repair')),
      title text not null,
      detail text,
      origin text not null check (origin in ('rule', 'defect', 'person')),
      rule_id uuid references rule,
      defect_id uuid references defect,
      planned_on date,
      planned_at timestamptz,
      planned_by uuid references person,
      expected_minutes int,
      opened_at timestamptz not null,
      opened_by uuid references person,
      started_at timestamptz,
      started_by uuid references person,
      ended_at timestamptz,
      withdrawn_by uuid references person,
      withdraw_reason text,
      revision int not null default 1
    );
    create unique index task_open_rule on task (unit_id, rule_id) where ended_at is null and rule_id is not null;
    create unique index task_open_defect on task (defect_id) where ended_at is null and defect_id is not null;
    create index task_open on task (unit_id) where ended_at is null;
    create index task_unit on task (unit_id, opened_at);

    create table task_note (
      id uuid primary key default gen_random_uuid(),
      task_id uuid not null references task,
      text text not null,
      written_at timestamptz not null,
      written_by uuid references person
    );
    create index task_note_task on task_note (task_id, written_at);

    create table closure (
      id uuid primary key default gen_random_uuid(),
      task_id uuid not null references task,
      unit_id uuid not null references unit,
      rule_id uuid references rule,
      closed_at timestamptz not null,
      closed_on date not null,
      engine_hours_tenths int not null,
      outings int not null,
      minutes int,
      note text,
      results jsonb not null default '[]',
      parts_used jsonb not null default '[]',
      held_since_at timestamptz,
      closed_by uuid references person,
      recorded_at timestamptz not null default now(),
      reversed_at timestamptz,
      reversed_by uuid references person,
      reverse_reason text
    );
    create index closure_unit_rule on closure (unit_id, rule_id, closed_at) where reversed_at is null;
    create unique index closure_task on closure (task_id) where reversed_at is null;
    create index closure_closed on closure (closed_at) where reversed_at is null;

    create table baseline (
      id uuid primary key default gen_random_uuid(),
      unit_id uuid not null references unit,
      rule_id uuid not null references rule,
      closed_on date not null,
      engine_hours_tenths int not null,
      outings int not null,
      note text not null,
      recorded_at timestamptz not null default now(),
      recorded_by uuid references person,
      withdrawn_at timestamptz,
      withdrawn_by uuid references person
    );
    create index baseline_unit_rule on baseline (unit_id, rule_id) where withdrawn_at is null;

    create table digest (
      id uuid primary key default gen_random_uuid(),
      person_id uuid not null references person,
      week_on date not null,
      claimed_at timestamptz not null,
      sent_at timestamptz,
      failure text,
      unique (person_id, week_on)
    );

    create table mail (
      id uuid primary key default gen_random_uuid(),
      kind text not null,
      recipient text not null,
      subject text not null,
      text_body text not null,
      html_body text,
      headers jsonb not null default '{}',
      queued_at timestamptz not null default now(),
      claimed_at timestamptz,
      sent_at timestamptz,
      failure text
    );

    create table worker_heartbeat (
      worker_id text primary key,
      started_at timestamptz not null,
      beat_at timestamptz not null,
      stopped_at timestamptz
    );
  `.execute(db);
}
