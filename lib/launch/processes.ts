import { type ChildProcess, spawn } from 'node:child_process';
import { createInterface } from 'node:readline';
import { readFileSync } from 'node:fs';

export interface Exit {
  code: number | null;
  signal: NodeJS.Signals | null;
}

export interface Child {
  name: string;
  pid: number;
  exited: Promise<Exit>;
  /** Asks it to end, and after ten seconds ends it. */
  stop(): Promise<void>;
}

export interface ChildOptions {
  name: string;
  command: string;
  args: string[];
  cwd: string;
  env: NodeJS.ProcessEnv;
  onLine(line: string): void;
}

const GRACE_MS = 10_000;

/** A child in a process group of its own, so that Ctrl-C reaches it through us, in the order we choose. */
export function startChild(options: ChildOptions): Child {
  const child = spawn(options.command, options.args, {
    cwd: options.cwd,
    env: options.env,
    detached: true,
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  for (const stream of [child.stdout, child.stderr]) {
    createInterface({ input: stream }).on('line', options.onLine);
  }
  const exited = new Promise<Exit>((resolve) => {
    child.once('error', (error) => {
      options.onLine(`could not be started: ${error.message}`);
      resolve({ code: 127, signal: null });
    });
    child.once('close', (code, signal) => resolve({ code, signal }));
  });
  return { name: options.name, pid: child.pid ?? 0, exited, stop: () => stopGroup(child, exited) };
}

async function stopGroup(child: ChildProcess, exited: Promise<Exit>): Promise<void> {
  if (!child.pid) return;
  const { pid } = child;
  signalGroup(pid, 'SIGTERM');
  const timer = setTimeout(() => signalGroup(pid, 'SIGKILL'), GRACE_MS);
  await exited;
  clearTimeout(timer);
}

/** Signals a process group; one that is gone already is fine. */
export function signalGroup(pid: number, signal: NodeJS.Signals): void {
  try {
    process.kill(-pid, signal);
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code !== 'ESRCH') throw error;
  }
}

/**
 * When a process began, in the kernel's ticks since boot: with the pid it names one process for good, as pids are
 * used again. Undefined when there is none. Field 22 of /proc/PID/stat, see proc(5); the name in field 2 may hold
 * blanks and brackets, so counting starts after the last bracket.
 */
export function startTicks(pid: number): string | undefined {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8');
    const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ');
    return fields[0] === 'Z' ? undefined : fields[19];
  } catch {
    return undefined;
  }
}
