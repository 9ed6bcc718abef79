import { spawnSync } from 'node:child_process';
import { existsSync, readFileSync, readdirSync } from 'node:fs';
import path from 'node:path';

/**
 * What has to be on the machine before any package can be imported. Uses nothing but Node itself.
 * Child processes get this process's environment as it is; nothing here reads a variable of ours.
 */

export const root = path.resolve(import.meta.dirname, '../..');

/** @param {string} message @returns {never} */
export function fail(message) {
  console.error(`\nWakewright cannot start: ${message}`);
  process.exit(1);
}

/**
 * Prints a line, does the work, prints how long it took.
 * @template T @param {string} label @param {() => T | Promise<T>} work @returns {Promise<T>}
 */
export async function step(label, work) {
  console.log(`• ${label} …`);
  const began = performance.now();
  const result = await work();
  console.log(`  done, ${((performance.now() - began) / 1000).toFixed(1)} s`);
  return result;
}

export function checkNode() {
  const [major = 0, minor = 0] = process.versions.node.split('.').map(Number);
  const fits = (major === 20 && minor >= 19) || major === 21 || major === 22;
  if (!fits) fail(`Node.js 20.19 or newer, below 23, is needed; this is ${process.versions.node}.`);
}

/** @typedef {{ version?: string, integrity?: string, dev?: boolean, optional?: boolean, devOptional?: boolean }} Locked */

/** @param {string} file @returns {Record<string, Locked> | undefined} */
function readLock(file) {
  try {
    return JSON.parse(readFileSync(file, 'utf8')).packages;
  } catch {
    return undefined;
  }
}

/**
 * True when node_modules holds what the lock asks for. npm writes the second file at the very end of an
 * installation, so one that was cut short does not count. Optional packages may be missing (other platforms).
 * @param {Record<string, Locked> | undefined} wanted the packages of package-lock.json
 * @param {Record<string, Locked> | undefined} present those of node_modules/.package-lock.json
 * @param {{ withTests: boolean }} options
 */
export function packagesCurrent(wanted, present, { withTests }) {
  if (!wanted || !present) return false;
  return Object.entries(wanted).every(([name, locked]) => {
    if (name === '') return true;
    const found = present[name];
    if (found) return found.version === locked.version && found.integrity === locked.integrity;
    return Boolean(locked.optional || (!withTests && (locked.dev || locked.devOptional)));
  });
}

/** @param {{ withTests: boolean }} options */
export async function ensurePackages({ withTests }) {
  const wanted = readLock(path.join(root, 'package-lock.json'));
  if (!wanted) fail('package-lock.json is missing or damaged.');
  if (packagesCurrent(wanted, readLock(path.join(root, 'node_modules/.package-lock.json')), { withTests }))
    return;
  await step('Installing npm packages from the lock', () => {
    const args = [
      'ci',
      '--no-audit',
      '--no-fund',
      '--loglevel=error',
      withTests ? '--include=dev' : '--omit=dev',
    ];
    run('npm', args, 'npm ci failed; its message is above.');
  });
}

/** @param {string} command @param {string[]} args @param {string} problem */
function run(command, args, problem) {
  const { status, error } = spawnSync(command, args, { cwd: root, stdio: ['ignore', 'inherit', 'inherit'] });
  if (error || status !== 0) fail(`${problem}${error ? ` (${error.message})` : ''}`);
}

const postgresInstalled = () => {
  const base = '/usr/lib/postgresql';
  return existsSync(base) && readdirSync(base).some((version) => existsSync(`${base}/${version}/bin/initdb`));
};

/** Debian's packages by what shows that they are there. */
const DEBIAN = {
  postgresql: postgresInstalled,
  chromium: () => existsSync('/usr/bin/chromium'),
  'python3-dateutil': () => spawnSync('python3', ['-c', 'import dateutil.rrule']).status === 0,
};

/** @param {(keyof typeof DEBIAN)[]} names */
export async function ensureDebian(names) {
  const missing = names.filter((name) => !DEBIAN[name]());
  if (missing.length === 0) return;
  const list = missing.join(' ');
  const byHand = `Install it yourself: apt-get install ${list}`;
  if (spawnSync('apt-get', ['--version']).status !== 0)
    fail(`${list} is missing and there is no apt-get. ${byHand}`);
  const asRoot = process.getuid?.() === 0 ? [] : ['sudo'];
  if (asRoot.length > 0 && spawnSync('sudo', ['--version']).status !== 0) {
    fail(`${list} is missing, and installing it takes root or sudo. ${byHand}`);
  }
  await step(`Installing ${list} from Debian’s packages`, () => {
    for (const args of [
      ['update', '-qq'],
      ['install', '-y', '-qq', '--no-install-recommends', ...missing],
    ]) {
      const [command = '', ...rest] = [
        ...asRoot,
        'env',
        'DEBIAN_FRONTEND=noninteractive',
        'apt-get',
        ...args,
      ];
      const { status } = spawnSync(command, rest, { stdio: ['inherit', 'ignore', 'inherit'] });
      if (status !== 0) fail(`apt-get ${args[0]} failed. ${byHand}`);
    }
  });
  const still = missing.filter((name) => !DEBIAN[name]());
  if (still.length > 0) fail(`${still.join(' ')} was installed but is not where it is expected.`);
}

/** Lets this process import TypeScript from here on. */
export async function registerTypeScript() {
  const { register } = await import('tsx/esm/api');
  register();
}
