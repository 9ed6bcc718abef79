import { buildCurrent, noteBuild, sourcesHash } from './build';
import { buildCommand } from './commands';
import { startChild, type Child } from './processes';
import { step } from './requirements.mjs';

/**
 * Builds for production unless the last build was made from these sources. `onStart` gets the child, to be stopped
 * when the person does not wait for it. Throws with the build's output.
 */
export async function ensureBuild(
  root: string,
  onStart: (build: Child) => void = () => undefined,
): Promise<void> {
  const hash = sourcesHash(root);
  if (buildCurrent(root, hash)) return;
  await step('Building the application', async () => {
    const output: string[] = [];
    const build = startChild({
      name: 'build',
      ...buildCommand(root),
      cwd: root,
      env: { ...process.env, NODE_ENV: 'production', NEXT_TELEMETRY_DISABLED: '1' },
      onLine: (line) => output.push(line),
    });
    onStart(build);
    const { code, signal } = await build.exited;
    if (code !== 0) throw new Error(`the build failed (${signal ?? code}):\n${output.join('\n')}`);
  });
  noteBuild(root, hash);
}
