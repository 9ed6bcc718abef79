import path from 'node:path';
import { buildCurrent, noteBuild, sourcesHash } from './build';
import { buildCommand } from './commands';
import { withLock } from './lock';
import { startChild, type Child } from './processes';
import { step } from './requirements.mjs';

/**
 * Builds for production unless the last build was made from these sources. `onStart` gets the child, to be stopped
 * when the person does not wait for it. Processes that want a build at the same time get one build. Throws with
 * the build's output.
 */
export async function ensureBuild(
  root: string,
  onStart: (build: Child) => void = () => undefined,
): Promise<void> {
  if (buildCurrent(root)) return;
  await withLock(path.join(root, '.wakewright', 'build.lock'), async () => {
    const hash = sourcesHash(root);
    if (buildCurrent(root, hash)) return;
    await step('Building the application', () => build(root, onStart));
    noteBuild(root, hash);
  });
}

async function build(root: string, onStart: (build: Child) => void): Promise<void> {
  const output: string[] = [];
  const child = startChild({
    name: 'build',
    ...buildCommand(root),
    cwd: root,
    env: { ...process.env, NODE_ENV: 'production', NEXT_TELEMETRY_DISABLED: '1' },
    onLine: (line) => output.push(line),
  });
  onStart(child);
  const { code, signal } = await child.exited;
  if (code !== 0) throw new Error(`the build failed (${signal ?? code}):\n${output.join('\n')}`);
}
