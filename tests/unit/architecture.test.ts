import { execFileSync } from 'node:child_process';
import { existsSync, mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { checkImports } from '../support/house';
import { checkSource } from '../support/source-rules';

/** Files and functions that are longer than the rest, each with its reason. */
const LONG_FOR_A_REASON: Record<string, string> = {
  'db/tables.ts': 'one list of columns, in the order of the migrations',
};

const sources = () =>
  execFileSync('git', ['ls-files', '--cached', '--others', '--exclude-standard', '*.ts', '*.tsx', '*.mjs'])
    .toString()
    .split('\n')
    .filter((file) => existsSync(file));

describe('the house', () => {
  test('every import is one that its folder may make', async () => {
    const { modules, violations } = await checkImports(process.cwd());
    expect(violations).toEqual([]);
    expect(modules).toBeGreaterThan(50);
  }, 60_000);

  test('no source reads a clock, the environment or the job queue where it must not, or is too long', () => {
    const found = sources().flatMap((file) => checkSource(file, readFileSync(file, 'utf8')));
    const isExcused = (at: string, broken: string) =>
      broken.includes('lines') && (at.split(':')[0] ?? '') in LONG_FOR_A_REASON;
    expect(found.filter(({ at, broken }) => !isExcused(at, broken))).toEqual([]);
    const excused = found.filter(({ at, broken }) => isExcused(at, broken)).map(({ at }) => at.split(':')[0]);
    expect(new Set(excused), 'an excuse that nothing needs any more').toEqual(
      new Set(Object.keys(LONG_FOR_A_REASON)),
    );
  }, 60_000);
});

describe('a break of the house is found', () => {
  const directory = mkdtempSync(path.join(tmpdir(), 'house-'));
  const files: Record<string, string> = {
    'tsconfig.json': '{ "compilerOptions": { "paths": { "@/*": ["./*"] } } }',
    'db/client.ts': 'export const db = 1;',
    'db/tables.ts': 'export interface DB { unit: string }',
    'db/queries/units.ts': "import type { DB } from '../tables'; export const units = (db: DB) => db;",
    'lib/domain/due.ts': "import { db } from '@/db/client'; export const due = db;",
    'lib/actions/check-in.ts': "import { units } from '@/db/queries/units'; export const checkIn = units;",
    'components/fleet/Fleet.tsx':
      "import { checkIn } from '@/lib/actions/check-in'; export const Fleet = checkIn;",
    'lib/client/api.ts': "import type { DB } from '@/db/tables'; export type Seen = DB;",
    'app/api/v1/units/route.ts': "import { db } from '@/db/client'; export const GET = db;",
    'jobs/tasks/refresh.ts':
      "import { Fleet } from '@/components/fleet/Fleet'; export const refresh = Fleet;",
    'lib/schemas/a.ts': "import { b } from './b'; export const a = b;",
    'lib/schemas/b.ts': "import { a } from './a'; export const b = a;",
    'lib/helpers/x.ts': "import { a } from '../schemas/a'; export const x = a;",
    'lib/actions/queue.ts': "import { run } from 'graphile-worker'; export const queue = run;",
  };

  beforeAll(() => {
    for (const [file, text] of Object.entries(files)) {
      mkdirSync(path.dirname(path.join(directory, file)), { recursive: true });
      writeFileSync(path.join(directory, file), text);
    }
  });
  afterAll(() => rmSync(directory, { recursive: true }));

  test('in an import, a type’s included', async () => {
    const { violations } = await checkImports(directory);
    expect(violations).toEqual([
      'app/api/v1/units/route.ts → db/client.ts (app/api)',
      'components/fleet/Fleet.tsx → lib/actions/check-in.ts (components/<noun>)',
      'jobs/tasks/refresh.ts → components/fleet/Fleet.tsx (jobs)',
      'lib/actions/queue.ts → graphile-worker (lib/actions)',
      'lib/client/api.ts → db/tables.ts (lib/client)',
      'lib/domain/due.ts → db/client.ts (lib/domain)',
      'lib/helpers/x.ts → lib/schemas/a.ts (outside the house)',
      'lib/schemas/a.ts → lib/schemas/b.ts (circle)',
    ]);
  }, 60_000);

  test.each([
    ['lib/domain/due.ts', 'export const now = new Date();', 'reads the clock'],
    ['lib/domain/due.ts', 'export const now = new Date;', 'reads the clock'],
    ['lib/domain/due.ts', 'export const now = Date();', 'reads the clock'],
    ['lib/domain/due.ts', 'export const now = Date.now();', 'reads the clock'],
    ['lib/domain/due.ts', "export const now = Date['now']();", 'reads the clock'],
    ['lib/domain/due.ts', 'export const dice = Math.random();', 'rolls dice'],
    ['db/queries/units.ts', 'export const now = performance.now();', 'reads the clock'],
    ['lib/http/handle.ts', 'export const port = process.env.PORT;', 'reads the environment'],
    ['lib/http/handle.ts', "import { env } from 'node:process';", 'reads the environment'],
    ['lib/http/handle.ts', 'const { env } = process;', 'reads the environment'],
    [
      'lib/actions/check-in.ts',
      'sql`select graphile_worker.add_job(${name})`;',
      'enqueues a job past lib/enqueue.ts',
    ],
    ['lib/domain/due.ts', `function due() {${'\n'.repeat(60)}}`, 'has a function of 61 lines, above 60'],
    [
      'components/ui/Tag.tsx',
      `function Tag() {${'\n'.repeat(100)}}`,
      'has a function of 101 lines, above 100',
    ],
    ['lib/domain/due.ts', '\n'.repeat(250) + 'due();', 'has 251 lines, above 250'],
    ['lib/domain/due.ts', '// eslint-disable-next-line', 'silences a checker'],
  ])('in %s (case %#)', (file, text, broken) => {
    expect(checkSource(file, text).map((violation) => violation.broken)).toEqual([broken]);
  });

  test.each([
    ['lib/domain/due.ts', "export const day = new Date('2026-03-29');"],
    ['lib/domain/due.ts', 'export const day = new Date(Date.UTC(2026, 2, 29));'],
    ['lib/domain/due.ts', '// Date.now() is an argument'],
    ['lib/http/handle.ts', 'export const now = new Date();'],
    ['lib/env.ts', 'export const port = process.env.PORT;'],
    ['lib/enqueue.ts', 'sql`select graphile_worker.add_job(${name})`;'],
    ['lib/domain/due.ts', `function due() {${'\n'.repeat(59)}}`],
    ['components/ui/Tag.tsx', `function Tag() {${'\n'.repeat(99)}}`],
  ])('and what is allowed in %s is not (case %#)', (file, text) => {
    expect(checkSource(file, text)).toEqual([]);
  });
});
