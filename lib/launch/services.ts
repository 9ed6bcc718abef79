import { existsSync } from 'node:fs';
import path from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import type { Env } from '@/lib/env';
import { webCommand, workerCommand } from './commands';
import { type Child, startChild } from './processes';

export interface ServicesOptions {
  root: string;
  mode: 'start' | 'dev';
  env: Env;
  /** Told of every process that was started. */
  note?(name: string, pid: number): void;
  print?(line: string): void;
}

export interface Services {
  /** Settles when the web server answers. */
  ready: Promise<void>;
  /** Settles, with what happened, when the web server ends by itself. */
  failed: Promise<string>;
  stop(): Promise<void>;
}

const FIRST_PAUSE_MS = 500;
const LONGEST_PAUSE_MS = 30_000;
/** A worker that ran this long was well; the pause before its next start is short again. */
const WELL_AFTER_MS = 60_000;

/** The environment of the children: ours, then what was settled, then what libraries read under their own names. */
export function childEnv(env: Env, mode: 'start' | 'dev'): NodeJS.ProcessEnv {
  const settled = Object.entries(env).map(([name, value]) => [
    name,
    value === undefined ? '' : String(value),
  ]);
  return {
    ...process.env,
    ...Object.fromEntries(settled),
    NODE_ENV: mode === 'start' ? 'production' : 'development',
    NEXTAUTH_URL: env.PUBLIC_URL,
    NEXTAUTH_SECRET: env.AUTH_SECRET,
    NEXT_TELEMETRY_DISABLED: '1',
  };
}

/** Runs the web server and the worker. A worker that ends is started again; without the web server all is over. */
export function runServices(options: ServicesOptions): Services {
  const { root, mode, env, note = () => undefined, print = console.log } = options;
  let stopping = false;
  const children = new Map<string, Child>();
  const start = (name: string, command: { command: string; args: string[] }) => {
    const child = startChild({
      name,
      ...command,
      cwd: root,
      env: childEnv(env, mode),
      onLine: (line) => print(`${name.padEnd(6)} │ ${line}`),
    });
    children.set(name, child);
    note(name, child.pid);
    return child;
  };

  async function keepWorker(): Promise<void> {
    for (let pause = FIRST_PAUSE_MS; ; pause = Math.min(pause * 2, LONGEST_PAUSE_MS)) {
      const began = Date.now();
      const { code, signal } = await start('worker', workerCommand(root, mode)).exited;
      if (stopping) return;
      if (Date.now() - began > WELL_AFTER_MS) pause = FIRST_PAUSE_MS;
      print(`• The worker ended (${signal ?? code}); starting it again in ${pause / 1000} s.`);
      await wait(pause, undefined, { ref: false });
      if (stopping) return;
    }
  }

  const web = start('web', webCommand(root, mode, env.HOST, env.PORT));
  if (existsSync(path.join(root, 'jobs/worker.ts'))) void keepWorker();
  else print('• This version has no worker yet.');
  const failed = web.exited.then(({ code, signal }) => `the web server ended (${signal ?? code}).`);
  return {
    ready: untilAnswers(`http://${env.HOST}:${env.PORT}/api/v1/health`, failed),
    failed: stoppable(failed, () => stopping),
    stop: async () => {
      stopping = true;
      await Promise.all([...children.values()].map((child) => child.stop()));
    },
  };
}

/** A promise that stays open when the end was asked for. */
const stoppable = (ended: Promise<string>, asked: () => boolean) =>
  new Promise<string>((resolve) => void ended.then((message) => asked() || resolve(message)));

/** Settles at the first answer of any kind; throws when `failed` settles before, or after two minutes. */
export async function untilAnswers(url: string, failed: Promise<string>): Promise<void> {
  const deadline = Date.now() + 120_000;
  let problem: string | undefined;
  void failed.then((message) => (problem = message));
  while (Date.now() < deadline) {
    if (problem) throw new Error(problem);
    const answered = await fetch(url, { redirect: 'manual' }).then(
      () => true,
      () => false,
    );
    if (answered) return;
    await wait(50);
  }
  throw new Error(`${url} did not answer within two minutes.`);
}
