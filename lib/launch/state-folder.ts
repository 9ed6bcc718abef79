import { createHash, randomUUID } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { canServerReach } from '@/db/local-server';

/** Reads a file of `.wakewright`, making it at first: mode 600. */
export function keptValue(root: string, name: string, make: () => string): string {
  const file = path.join(root, '.wakewright', name);
  if (existsSync(file)) return readFileSync(file, 'utf8').trim();
  mkdirSync(path.dirname(file), { recursive: true });
  const value = make();
  writeFileSync(file, `${value}\n`, { mode: 0o600 });
  return value;
}

/**
 * Folder for PostgreSQL's data: `.wakewright` of the checkout. When PostgreSQL's user cannot get there (root's
 * home is closed to it) a folder below /var/lib, named after this checkout: its path and an id kept in it, so
 * that neither a copy nor a fresh clone at the same path meets another one's data.
 */
export async function postgresHome(root: string): Promise<string> {
  const inside = path.join(root, '.wakewright');
  mkdirSync(inside, { recursive: true });
  if (await canServerReach(inside)) return inside;
  const id = keptValue(root, 'checkout-id', randomUUID);
  const name = createHash('sha256').update(`${root}\n${id}`).digest('hex').slice(0, 16);
  return `/var/lib/wakewright-${name}`;
}
