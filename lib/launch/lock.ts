import { mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { startTicks } from './processes';

const self = () => `${process.pid} ${startTicks(process.pid) ?? ''}`;

function holder(file: string): string | undefined {
  try {
    return readFileSync(file, 'utf8');
  } catch {
    return undefined;
  }
}

function claim(file: string): boolean {
  try {
    writeFileSync(file, self(), { flag: 'wx' });
    return true;
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code === 'EEXIST') return false;
    throw error;
  }
}

/** An empty file is one that is being written at this moment. */
function isLeftOver(text: string): boolean {
  const [pid, ticks] = text.split(' ');
  return text !== '' && startTicks(Number(pid)) !== ticks;
}

/** Does `work` while no other process of this machine does it under the same file; waits for its turn. */
export async function withLock<T>(file: string, work: () => Promise<T>): Promise<T> {
  mkdirSync(path.dirname(file), { recursive: true });
  while (!claim(file)) {
    const text = holder(file);
    if (text !== undefined && isLeftOver(text)) rmSync(file, { force: true });
    else await wait(100);
  }
  try {
    return await work();
  } finally {
    rmSync(file, { force: true });
  }
}
