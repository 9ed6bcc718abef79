import type { TestProject } from 'vitest/node';
import { openTestServer } from './test-server';

declare module 'vitest' {
  interface ProvidedContext {
    serverUrl: string;
  }
}

/** Vitest's global set-up of tests that need a database: PostgreSQL with a migrated template. */
export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  const server = await openTestServer();
  project.provide('serverUrl', server.serverUrl);
  return () => server.stop();
}
