'use client';

import type { Readiness } from '@/lib/schemas/worker';
import { usePolled } from './use-polled';

const POLL_MS = 5_000;
const keyOf = ({ worker }: { worker: { lagSeconds: number } }) => String(worker.lagSeconds);

/**
 * For how many seconds the job that waits longest could have run, asked again every five seconds while the page is
 * seen: a layout is drawn once, and a list may stand open all day. A failed answer leaves the last one.
 */
export function useLag(first: number): number {
  const { data } = usePolled<Pick<Readiness, 'worker'>>('/api/v1/ready', {
    everyMs: POLL_MS,
    initial: { worker: { lagSeconds: first, alive: true, workers: 1 } },
    keyOf,
  });
  return data.worker.lagSeconds;
}
