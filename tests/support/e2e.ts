import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { test as base } from '@playwright/test';
import { type Mailbox, startMailbox } from '../fakes/mailbox';
import { startObjectStore } from '../fakes/object-store';
import { type App, startApp } from './app';
import { cloneDatabase, type TestDatabase } from './clone';
import { DEMO } from './database-names';

/** The whole product on a copy of the demo: servers, worker, mailbox and the database behind them. */
export interface Running {
  app: App;
  mailbox: Mailbox;
  database: TestDatabase;
}

/** What the operator of an empty database is asked for. */
export const SETUP_TOKEN = 'tests-only: printed at start';

async function run(template: string | undefined, use: (running: Running) => Promise<void>): Promise<void> {
  const database = await cloneDatabase(process.env.TEST_SERVER_URL ?? '', template);
  const mailbox = await startMailbox();
  const directory = await mkdtemp(path.join(tmpdir(), 'wakewright-files-'));
  const store = await startObjectStore({ directory });
  const app = await startApp({
    databaseUrl: database.url,
    smtpUrl: mailbox.smtpUrl,
    filesUrl: store.url,
    env: { SETUP_TOKEN },
  });
  try {
    await use({ app, mailbox, database });
  } finally {
    await app.stop();
    await mailbox.stop();
    await store.stop();
    await rm(directory, { recursive: true });
    await database.destroy();
  }
}

/**
 * Playwright's `test` with the product running. `shared` lives as long as the tests of one run and holds the demo;
 * `fresh` is a copy of the demo for one test alone, `empty` a database in which nothing is set up.
 * `page.goto('/…')` goes to `shared` unless a test names another base address.
 */
export const test = base.extend<{ fresh: Running; empty: Running }, { shared: Running }>({
  shared: [async ({}, use) => run(DEMO, use), { scope: 'worker', timeout: 180_000 }],
  fresh: async ({}, use) => run(DEMO, use),
  empty: async ({}, use) => run(undefined, use),
  baseURL: async ({ shared }, use) => use(shared.app.baseUrl),
});

export { expect } from '@playwright/test';
