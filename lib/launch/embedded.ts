import path from 'node:path';
import { pathToFileURL } from 'node:url';
import type { Kysely } from 'kysely';
import { findOperator } from '@/db/queries/operator';
import { createDatabase } from '@/db/client';
import { databaseExists, dropDatabase, makeDatabase, renameDatabase } from '@/db/databases';
import { type LocalServer, startLocalServer } from '@/db/local-server';
import { migrateToLatest } from '@/db/migrate';
import type { DB } from '@/db/tables';
import { step } from './requirements.mjs';
import { postgresHome } from './state-folder';

const NAME = 'wakewright';
const LOADING = 'wakewright_loading';

/** Starts the private server, and says where its data are when that is not inside the project. */
export async function startEmbeddedServer(root: string): Promise<LocalServer> {
  const home = await postgresHome(root);
  if (!home.startsWith(root))
    console.log(`• PostgreSQL’s user cannot reach this folder; its data are in ${home}.`);
  return step('Starting PostgreSQL', () => startLocalServer({ directory: path.join(home, 'postgres') }));
}

/** True when the database at `url` holds no operator's data. */
export async function isEmpty(url: string): Promise<boolean> {
  const db = createDatabase({ url, max: 1 });
  try {
    return (await findOperator(db)) === undefined;
  } finally {
    await db.destroy();
  }
}

/** Applies what is missing of the migrations. Throws, naming the server, when it cannot be reached. */
export async function migrate(url: string): Promise<void> {
  await step('Bringing the database up to date', async () => {
    const applied = await migrateToLatest(url).catch((error: unknown) => {
      const { host, pathname } = new URL(url);
      throw new Error(`the database ${pathname.slice(1)} on ${host} could not be brought up to date`, {
        cause: error,
      });
    });
    if (applied.length > 0) console.log(`  applied: ${applied.join(', ')}`);
  });
}

/**
 * Brings the embedded database up to date, and the demo into it when it is empty. The demo is loaded under another
 * name and renamed when complete, so an interrupted load is begun again, not taken for somebody's data.
 */
export async function prepareEmbeddedDatabase(server: LocalServer): Promise<string> {
  const admin = server.url('postgres');
  const url = server.url(NAME);
  if (await databaseExists(admin, NAME)) {
    await migrate(url);
    if (!(await isEmpty(url))) return url;
  }
  await dropDatabase(admin, LOADING);
  await makeDatabase(admin, LOADING);
  await migrate(server.url(LOADING));
  await step('Loading the demo fleet', () => loadDemo(server.url(LOADING)));
  await dropDatabase(admin, NAME);
  await renameDatabase(admin, LOADING, NAME);
  return url;
}

type SeedDemo = (db: Kysely<DB>, options: { now: Date; progress(line: string): void }) => Promise<void>;

/** Loads the demo into a migrated, empty database. */
export async function loadDemo(url: string): Promise<void> {
  const file = path.resolve('db/seed/demo.ts');
  const { seedDemo } = (await import(pathToFileURL(file).href)) as { seedDemo: SeedDemo };
  const db = createDatabase({ url, applicationName: 'wakewright-demo', statementTimeoutMs: 0 });
  try {
    await seedDemo(db, { now: new Date(), progress: (line) => console.log(`  ${line}`) });
  } finally {
    await db.destroy();
  }
}
