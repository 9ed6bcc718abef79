import { afterAll, beforeAll, beforeEach, inject } from 'vitest';
import type { Kysely } from 'kysely';
import type { DB } from '@/db/tables';
import { cloneDatabase, type TestDatabase } from './clone';

/**
 * Gives the test file a database of its own, emptied before each test unless `keep` is set:
 *
 *     const database = testDatabase();
 *     test('…', async () => { await insertDock(database.db, …); });
 */
export function testDatabase(options: { template?: string; keep?: boolean } = {}): {
  db: Kysely<DB>;
  url: string;
} {
  let opened: TestDatabase | undefined;
  const get = () => {
    if (!opened) throw new Error('the test database is there from beforeAll on');
    return opened;
  };
  beforeAll(async () => {
    opened = await cloneDatabase(inject('serverUrl'), options.template);
  });
  if (!options.keep) beforeEach(() => get().truncate());
  afterAll(() => opened?.destroy());
  return {
    get db() {
      return get().db;
    },
    get url() {
      return get().url;
    },
  };
}
