import { expect, test } from 'vitest';
import { packagesCurrent } from '@/lib/launch/requirements.mjs';

const lock = {
  '': { version: '0.1.0' },
  'node_modules/kysely': { version: '0.28.19', integrity: 'sha512-k' },
  'node_modules/vitest': { version: '4.1.12', integrity: 'sha512-v', dev: true },
  'node_modules/@esbuild/aix': { version: '1.0.0', integrity: 'sha512-a', optional: true },
};
const runtime = { 'node_modules/kysely': { version: '0.28.19', integrity: 'sha512-k' } };
const all = { ...runtime, 'node_modules/vitest': { version: '4.1.12', integrity: 'sha512-v', dev: true } };

test('a folder without packages, or with a cut-short installation, is not current', () => {
  expect(packagesCurrent(lock, undefined, { withTests: false })).toBe(false);
});

test('starting needs no package that only tests use', () => {
  expect(packagesCurrent(lock, runtime, { withTests: false })).toBe(true);
  expect(packagesCurrent(lock, runtime, { withTests: true })).toBe(false);
  expect(packagesCurrent(lock, all, { withTests: true })).toBe(true);
});

test('a package of another version than the lock’s is not current', () => {
  const older = { ...all, 'node_modules/kysely': { version: '0.28.18', integrity: 'sha512-j' } };
  expect(packagesCurrent(lock, older, { withTests: false })).toBe(false);
});
