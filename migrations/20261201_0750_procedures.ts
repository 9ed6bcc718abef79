import { sql, type Kysely } from 'kysely';

/**
 * Procedures in versions that are never edited. A rule names a procedure; a task keeps the version that stood when it
 * was opened.
 */
export async function up(db: Kysely<unknown>): Promise<void> {
  await sql`
    create table procedure (
      id uuid primary key default gen_random_uuid(),
      kind text not null check (kind in ('inspection', 'service', 'rebuild', 'repair')),
      name text not null,
      retired_at timestamptz,
      retired_by uuid references person,
      created_at timestamptz not null default now()
    );
    create unique index procedure_name on procedure (lower(name)) where retired_at is null;

    create table procedure_version (
      id uuid primary key default gen_random_uuid(),
      procedure_id uuid not null references procedure,
      version int not null check (version >= 1),
      steps jsonb not null,
      note text,
      written_at timestamptz not null default now(),
      written_by uuid references person,
      unique (procedure_id, version)
    );

    update rule set procedure_id = null;
    alter table rule add foreign key (procedure_id) references procedure;
    alter table task add procedure_version_id uuid references procedure_version;
  `.execute(db);
}
