import path from 'node:path';

/** A program to run with this Node. */
export interface Command {
  command: string;
  args: string[];
}

const node = (args: string[]): Command => ({ command: process.execPath, args });
const next = (root: string, ...args: string[]) =>
  node([path.join(root, 'node_modules/next/dist/bin/next'), ...args]);
const tsxCli = (root: string) => path.join(root, 'node_modules/tsx/dist/cli.mjs');

export const buildCommand = (root: string) => next(root, 'build');
export const webCommand = (root: string, mode: 'start' | 'dev', host: string, port: number) =>
  next(root, mode, '-H', host, '-p', String(port));
export const scriptCommand = (file: string, ...args: string[]) => node(['--import', 'tsx', file, ...args]);
export const workerCommand = (root: string, mode: 'start' | 'dev') =>
  mode === 'start'
    ? scriptCommand('jobs/worker.ts')
    : node([tsxCli(root), 'watch', '--clear-screen=false', 'jobs/worker.ts']);
