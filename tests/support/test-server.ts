import { execFile } from 'node:child_process';
import { promisify } from 'node:util';
import { scriptCommand } from '@/lib/launch/commands';
import { startThrowawayServer } from './throwaway-server';

export interface TestServer {
  /** Address of the server's maintenance database; withDatabase() turns it into that of another. */
  serverUrl: string;
  stop(): Promise<void>;
}

/**
 * The PostgreSQL of this test run: the one `npm test` started, or one of our own. It holds `wakewright_template`,
 * migrated and empty, and with `demo` also `wakewright_demo`.
 */
export async function openTestServer({ demo = false } = {}): Promise<TestServer> {
  const given = process.env.TEST_SERVER_URL;
  const own = given ? undefined : await startThrowawayServer();
  const serverUrl = given ?? own?.url('postgres') ?? '';
  // A process of its own: migrations and the demo are imported by path, which each test runner does its own way.
  const { command, args } = scriptCommand('tests/support/prepare.ts', serverUrl, ...(demo ? ['--demo'] : []));
  await promisify(execFile)(command, args);
  return { serverUrl, stop: async () => own?.stop() };
}
