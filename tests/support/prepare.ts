import { databaseExists, dropDatabase, makeDatabase, renameDatabase, withDatabase } from '@/db/databases';
import { migrateToLatest } from '@/db/migrate';
import { loadDemo } from '@/lib/launch/embedded';
import { DEMO, TEMPLATE } from './database-names';

/** Makes the databases that tests clone: `tsx tests/support/prepare.ts SERVER_URL [--demo]`. */
async function prepare(
  serverUrl: string,
  name: string,
  fill: (url: string) => Promise<unknown>,
): Promise<void> {
  if (await databaseExists(serverUrl, name)) return;
  const unfinished = `${name}_unfinished`;
  await dropDatabase(serverUrl, unfinished);
  await makeDatabase(serverUrl, unfinished);
  await fill(withDatabase(serverUrl, unfinished));
  await renameDatabase(serverUrl, unfinished, name);
}

const [serverUrl = '', flag] = process.argv.slice(2);
await prepare(serverUrl, TEMPLATE, (url) => migrateToLatest(url));
if (flag === '--demo') {
  await prepare(serverUrl, DEMO, async (url) => {
    await migrateToLatest(url);
    await loadDemo(url);
  });
}
