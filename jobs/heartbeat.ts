import { beatWorker } from '@/lib/actions/beat-worker';
import { endWorker } from '@/lib/actions/end-worker';
import type { Context } from '@/lib/context';
import type { WorkerLimits } from './limits';

type Options = {
  ctx: () => Context;
  workerId: string;
  limits: WorkerLimits;
  /** Called once, when this worker must not go on: others have its jobs. */
  onGone: (why: string) => void;
};

/**
 * Shows every `beatMs` that this worker lives, and frees the jobs of those that do not. A worker that finds it was
 * stopped for longer than the limit (a stopped process, a sleeping machine), or that was taken for dead, is told
 * to end: what it was doing is being done again elsewhere.
 */
export function keepHeartbeat({ ctx, workerId, limits, onGone }: Options): { stop(): Promise<void> } {
  let timer: NodeJS.Timeout | undefined;
  let stopped = false;
  let failing = false;
  let lastTurn = performance.now();

  async function turn(): Promise<void> {
    const pause = performance.now() - lastTurn;
    lastTurn = performance.now();
    if (pause > limits.goneAfterMs) return onGone(`did not run for ${Math.round(pause / 1000)} s`);
    try {
      const { alive, gone } = await beatWorker(ctx(), { workerId, goneAfterMs: limits.goneAfterMs });
      if (!alive) return onGone('was taken for dead by another worker');
      if (gone.length > 0) console.warn(`freed the jobs of workers that are gone: ${gone.join(', ')}`);
      if (failing) console.log('the database answers again');
      failing = false;
    } catch (error) {
      if (!failing) console.warn(`cannot show that this worker lives: ${(error as Error).message}`);
      failing = true;
    }
    if (!stopped) timer = setTimeout(() => void (running = turn()), limits.beatMs);
  }

  let running = turn();
  async function end(): Promise<void> {
    stopped = true;
    clearTimeout(timer);
    await running;
    await endWorker(ctx(), { workerId }).catch((error: Error) =>
      console.warn(`ended without saying so: ${error.message}`),
    );
  }
  let ending: Promise<void> | undefined;
  return { stop: () => (ending ??= end()) };
}
