import { sql, type Kysely } from 'kysely';

/**
 * Parts, kits and stock. What is on hand is the sum of moves, which are only ever added; a shelf is the row that
 * writers of one part at one dock lock, so that its sum is read and added to by one at a time.
 */
export async function up(db: Kysely<unknown>): Promise<void> {
  await sql`
    create table part (
      id uuid primary key,
      number text not null,
      name text not null,
      supplier text,
      is_kit boolean not null default false,
      created_at timestamptz not null,
      created_by uuid references person,
      retired_at timestamptz,
      retired_by uuid references person
    );
    create unique index part_number on part (lower(number)) where retired_at is null;

    create table kit_part (
      kit_id uuid not null references part,
      part_id uuid not null references part,
      quantity int not null check (quantity >= 1),
      primary key (kit_id, part_id),
      check (kit_id <> part_id)
    );
    create index kit_part_part on kit_part (part_id);

    create table shelf (
      part_id uuid not null references part,
      dock_id uuid not null references dock,
      low_at int check (low_at >= 0),
      primary key (part_id, dock_id)
    );

    create table stock_move (
      id uuid primary key default gen_random_uuid(),
      seq bigint not null generated always as identity unique,
      part_id uuid not null,
      dock_id uuid not null,
      quantity int not null,
      kind text not null check (kind in
        ('received', 'counted', 'moved_in', 'moved_out', 'made_up', 'broken_up', 'taken', 'put_back')),
      pair_id uuid not null,
      task_id uuid references task,
      closure_id uuid references closure,
      reason text,
      moved_at timestamptz not null,
      moved_by uuid references person,
      foreign key (part_id, dock_id) references shelf
    );
    create index stock_move_shelf on stock_move (part_id, dock_id, seq) include (quantity);
    create index stock_move_dock on stock_move (dock_id, seq);
    create index stock_move_pair on stock_move (pair_id);
    create index stock_move_task on stock_move (task_id) where task_id is not null;

    create table reservation (
      id uuid primary key default gen_random_uuid(),
      task_id uuid not null references task,
      part_id uuid not null,
      dock_id uuid not null,
      quantity int not null check (quantity >= 1),
      reserved_at timestamptz not null,
      reserved_by uuid references person,
      released_at timestamptz,
      released_by uuid references person,
      foreign key (part_id, dock_id) references shelf
    );
    create unique index reservation_standing on reservation (task_id, part_id, dock_id)
      where released_at is null;
    create index reservation_shelf on reservation (part_id, dock_id) where released_at is null;

    create table task_need (
      task_id uuid not null references task,
      part_id uuid not null references part,
      quantity int not null check (quantity >= 0),
      said_at timestamptz not null,
      said_by uuid references person,
      primary key (task_id, part_id)
    );
  `.execute(db);
}
