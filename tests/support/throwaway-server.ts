import { mkdirSync, readdirSync } from 'node:fs';
import path from 'node:path';
import { type LocalServer, removeLocalServer, startLocalServer } from '@/db/local-server';
import { startTicks } from '@/lib/launch/processes';
import { postgresHome } from '@/lib/launch/state-folder';

const PREFIX = 'test-postgres-';

/** Removes the servers of test runs that were killed before they could do it themselves. */
async function removeLeftOvers(home: string): Promise<void> {
  for (const name of readdirSync(home).filter((entry) => entry.startsWith(PREFIX))) {
    const [pid, ticks] = name.slice(PREFIX.length).split('-');
    if (startTicks(Number(pid)) !== ticks) await removeLocalServer(path.join(home, name));
  }
}

/** A PostgreSQL for this process alone, fast and forgetful; `stop()` removes it with all its data. */
export async function startThrowawayServer(settings: Record<string, string> = {}): Promise<LocalServer> {
  const home = await postgresHome(process.cwd());
  mkdirSync(home, { recursive: true });
  await removeLeftOvers(home);
  const directory = path.join(home, `${PREFIX}${process.pid}-${startTicks(process.pid)}`);
  const server = await startLocalServer({ directory, throwaway: true, settings });
  return { ...server, stop: () => removeLocalServer(directory) };
}
