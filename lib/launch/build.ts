import { createHash } from 'node:crypto';
import { existsSync, readFileSync, readdirSync, statSync, writeFileSync } from 'node:fs';
import path from 'node:path';

/** Folders and files `next build` reads. */
const SOURCES = [
  'app',
  'components',
  'db',
  'jobs',
  'lib',
  'migrations',
  'public',
  'proxy.ts',
  'instrumentation.ts',
  'next.config.mjs',
  'postcss.config.mjs',
  'tailwind.config.ts',
  'tsconfig.json',
  'package-lock.json',
];

function* files(entry: string): Generator<string> {
  const stat = statSync(entry, { throwIfNoEntry: false });
  if (!stat) return;
  if (!stat.isDirectory()) {
    yield entry;
    return;
  }
  for (const name of readdirSync(entry).sort()) yield* files(path.join(entry, name));
}

/** Changes when a source of the build does: names and contents, not times. */
export function sourcesHash(root: string): string {
  const hash = createHash('sha256').update(process.version);
  for (const source of SOURCES) {
    for (const file of files(path.join(root, source))) {
      const content = readFileSync(file);
      hash.update(`${path.relative(root, file)}\0${content.length}\0`).update(content);
    }
  }
  return hash.digest('hex');
}

const stamp = (root: string) => path.join(root, '.next', 'wakewright-sources');

/** True when the last finished build was made from these very sources. */
export function buildCurrent(root: string, hash = sourcesHash(root)): boolean {
  return (
    existsSync(path.join(root, '.next', 'BUILD_ID')) &&
    existsSync(stamp(root)) &&
    readFileSync(stamp(root), 'utf8') === hash
  );
}

/** Notes that the build was made from the sources of `hash`. */
export function noteBuild(root: string, hash: string): void {
  writeFileSync(stamp(root), hash);
}
