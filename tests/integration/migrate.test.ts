import { sql } from 'kysely';
import { expect, test } from 'vitest';
import { listMigrations, migrateToLatest, migrationsCurrent } from '@/db/migrate';
import { findOperator } from '@/db/queries/operator';
import { testDatabase } from '../support/database';

const database = testDatabase({ template: 'template0', keep: true });

test('an empty database gets every migration once, from two processes at the same time', async () => {
  expect(await migrationsCurrent(database.db)).toBe(false);
  const applied = await Promise.all([migrateToLatest(database.url), migrateToLatest(database.url)]);
  expect(applied.flat().sort()).toEqual(await listMigrations());
  expect(await migrationsCurrent(database.db)).toBe(true);
  expect(await migrateToLatest(database.url)).toEqual([]);
});

test('it has the job queue and no operator', async () => {
  const { rows } = await sql<{ found: string | null }>`
    select to_regproc('graphile_worker.add_job') as found`.execute(database.db);
  expect(rows[0]?.found).not.toBeNull();
  expect(await findOperator(database.db)).toBeUndefined();
});

test('a database of another version is not current', async () => {
  await sql`insert into kysely_migration (name, timestamp) values ('99991231_2359_later', '')`.execute(
    database.db,
  );
  expect(await migrationsCurrent(database.db)).toBe(false);
});
