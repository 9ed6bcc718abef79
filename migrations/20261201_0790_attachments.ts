import { sql, type Kysely } from 'kysely';

/** Pictures and documents of a unit, and of a task or a defect on it. The files lie in an object store. */
export async function up(db: Kysely<unknown>): Promise<void> {
  await sql`
    create table attachment (
      id uuid primary key,
      unit_id uuid not null references unit,
      task_id uuid references task,
      defect_id uuid references defect,
      kind text not null check (kind in ('picture', 'document')),
      name text not null,
      content_type text not null,
      object_key text not null unique,
      thumb_key text unique,
      bytes int not null check (bytes > 0),
      width int,
      height int,
      added_at timestamptz not null,
      added_by uuid references person,
      removed_at timestamptz,
      removed_by uuid references person
    );
    create index attachment_unit on attachment (unit_id, added_at);
    create index attachment_task on attachment (task_id) where task_id is not null;
    create index attachment_defect on attachment (defect_id) where defect_id is not null;
    create index attachment_removed on attachment (removed_at) where removed_at is not null;
  `.execute(db);
}
