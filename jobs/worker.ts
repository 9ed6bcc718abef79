import { env } from '@/lib/env';
import { startWorker } from './start-worker';

/** Ends at once: the jobs in hand are being done elsewhere. Whoever runs this process starts it again. */
function leave(why: string): never {
  console.error(`the worker ${why}; ending`);
  process.exit(75);
}

const worker = await startWorker(env(), leave);
console.log(`worker ready (${worker.workerId})`);
for (const signal of ['SIGTERM', 'SIGINT', 'SIGHUP'] as const) {
  process.once(signal, () => void worker.stop().then(() => process.exit(0)));
}
worker.ended.then(
  () => process.exit(0),
  (error: unknown) => {
    console.error(error);
    process.exit(1);
  },
);
