import { execFile } from 'node:child_process';
import { existsSync } from 'node:fs';
import path from 'node:path';

const FOLDERS = ['app', 'components', 'lib', 'db', 'migrations', 'jobs', 'proxy.ts', 'instrumentation.ts'];

interface CruiseResult {
  summary: { totalCruised: number; violations: { rule: { name: string }; from: string; to: string }[] };
}

/**
 * Imports below `directory` that the table in `.dependency-cruiser.cjs` does not allow, as `from → to (row)`, and
 * how many modules were looked at.
 */
export async function checkImports(directory: string): Promise<{ modules: number; violations: string[] }> {
  const root = process.cwd();
  const args = [
    path.join(root, 'node_modules/dependency-cruiser/bin/dependency-cruise.mjs'),
    ...['--config', path.join(root, '.dependency-cruiser.cjs'), '--output-type', 'json'],
    ...FOLDERS.filter((folder) => existsSync(path.join(directory, folder))),
  ];
  const output = await new Promise<string>((resolve, reject) => {
    const options = { cwd: directory, maxBuffer: 256 * 1024 * 1024 };
    execFile(process.execPath, args, options, (error, stdout, stderr) => {
      if (stdout) resolve(stdout);
      else reject(new Error(stderr, { cause: error }));
    });
  });
  const { summary } = JSON.parse(output) as CruiseResult;
  return {
    modules: summary.totalCruised,
    violations: summary.violations.map(({ rule, from, to }) => `${from} → ${to} (${rule.name})`).sort(),
  };
}
