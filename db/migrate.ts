import { readdir } from 'node:fs/promises';
import path from 'node:path';
import { pathToFileURL } from 'node:url';
import { runMigrations as migrateJobQueue } from 'graphile-worker';
import { type Kysely, type Migration, Migrator, sql } from 'kysely';
import { createDatabase } from './client';
import type { DB } from './tables';

/** Names of the migrations that belong to this version, oldest first. */
export async function listMigrations(root = process.cwd()): Promise<string[]> {
  const files = await readdir(path.join(root, 'migrations'));
  return files
    .filter((file) => /^\d.*\.ts$/.test(file))
    .map((file) => file.slice(0, -'.ts'.length))
    .sort();
}

async function loadMigrations(root: string): Promise<Record<string, Migration>> {
  const entries = await Promise.all(
    (await listMigrations(root)).map(async (name) => {
      const file = pathToFileURL(path.join(root, 'migrations', `${name}.ts`)).href;
      const migration = (await import(/* @vite-ignore */ /* webpackIgnore: true */ file)) as Migration;
      return [name, migration] as const;
    }),
  );
  return Object.fromEntries(entries);
}

/**
 * Brings the database at `url` up to this version: the job queue's own tables, then ours. Several processes may
 * call it at once; one waits for the other. Answers the names that were applied; throws what failed, applied up
 * to there.
 */
export async function migrateToLatest(url: string, root = process.cwd()): Promise<string[]> {
  await migrateJobQueue({ connectionString: url, noHandleSignals: true });
  const db = createDatabase({ url, max: 2, applicationName: 'wakewright-migrate', statementTimeoutMs: 0 });
  try {
    const migrator = new Migrator({ db, provider: { getMigrations: () => loadMigrations(root) } });
    const { error, results = [] } = await migrator.migrateToLatest();
    if (error) {
      const failed = results.find((result) => result.status === 'Error')?.migrationName;
      throw new Error(`migration ${failed ?? 'of the database'} failed`, { cause: error });
    }
    return results.map((result) => result.migrationName);
  } finally {
    await db.destroy();
  }
}

/** True when the database has exactly the migrations of this version; for GET /ready. */
export async function migrationsCurrent(db: Kysely<DB>, root = process.cwd()): Promise<boolean> {
  const known = await listMigrations(root);
  const table = await sql<{ found: boolean }>`
    select to_regclass('kysely_migration') is not null as found`.execute(db);
  if (!table.rows[0]?.found) return false;
  const { rows } = await sql<{ name: string }>`select name from kysely_migration order by name`.execute(db);
  return rows.map((row) => row.name).join('\n') === known.join('\n');
}
