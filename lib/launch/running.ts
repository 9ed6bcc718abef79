import { mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { signalGroup, startTicks } from './processes';

/** One process as noted in `.wakewright/running.json`. */
interface Noted {
  name: string;
  pid: number;
  ticks: string;
}

const fileOf = (root: string) => path.join(root, '.wakewright', 'running.json');

function read(root: string): Noted[] {
  try {
    return JSON.parse(readFileSync(fileOf(root), 'utf8')) as Noted[];
  } catch {
    return [];
  }
}

const alive = (noted: Noted) => startTicks(noted.pid) === noted.ticks;

/**
 * Claims this checkout for this process. Throws when another launcher is running on it. Children of a launcher
 * that was killed are ended first: they would keep their ports and connections.
 */
export async function claimCheckout(root: string): Promise<void> {
  const left = read(root).filter(alive);
  const launcher = left.find((noted) => noted.name === 'launcher');
  if (launcher && launcher.pid !== process.pid) {
    throw new Error(`Wakewright is already running from this folder (process ${launcher.pid}).`);
  }
  for (const noted of left) signalGroup(noted.pid, 'SIGTERM');
  for (let tries = 0; left.some(alive) && tries < 50; tries += 1) await wait(100);
  for (const noted of left.filter(alive)) signalGroup(noted.pid, 'SIGKILL');
  mkdirSync(path.dirname(fileOf(root)), { recursive: true });
  writeFileSync(fileOf(root), '[]');
  noteProcess(root, 'launcher', process.pid);
}

/** Notes a process, in place of an earlier one of that name. */
export function noteProcess(root: string, name: string, pid: number): void {
  const ticks = startTicks(pid);
  if (!ticks) return;
  const others = read(root).filter((noted) => noted.name !== name);
  writeFileSync(fileOf(root), JSON.stringify([...others, { name, pid, ticks }], null, 2));
}

export function releaseCheckout(root: string): void {
  rmSync(fileOf(root), { force: true });
}
