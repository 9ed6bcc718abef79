import { ensureBuild } from '@/lib/launch/ensure-build';
import { openTestServer } from './test-server';

/** Playwright's global set-up: the production build, and PostgreSQL with the demo fleet to clone. */
export default async function setup(): Promise<() => Promise<void>> {
  await ensureBuild(process.cwd());
  const server = await openTestServer({ demo: true });
  // Playwright hands the environment of its set-up to the processes that run the tests.
  process.env.TEST_SERVER_URL = server.serverUrl;
  return () => server.stop();
}
