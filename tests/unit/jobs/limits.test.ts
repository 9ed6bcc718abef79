import { expect, test } from 'vitest';
import { longestUntilTakenUpMs, TAKEN_UP_WITHIN_MS, workerLimits } from '@/jobs/limits';
import { workerEnv } from '../../support/worker';

const DATABASE = 'postgresql://127.0.0.1/limits';

test('by default a crashed worker’s jobs are taken up again within 30 seconds: 15 s silent, 5 s to the next look, 2 s to the next job', () => {
  const { WORKER_BEAT_MS } = workerEnv(DATABASE, { WORKER_BEAT_MS: '' });
  expect(longestUntilTakenUpMs(workerLimits(WORKER_BEAT_MS))).toBe(22_000);
  expect(TAKEN_UP_WITHIN_MS).toBe(30_000);
});

test('no setting makes it longer than that', () => {
  expect(() => workerEnv(DATABASE, { WORKER_BEAT_MS: '5001' })).toThrow(
    'WORKER_BEAT_MS must be at most 5000',
  );
  for (const beatMs of [200, 1_000, 3_333, 5_000]) {
    expect(longestUntilTakenUpMs(workerLimits(beatMs))).toBeLessThanOrEqual(TAKEN_UP_WITHIN_MS);
  }
});

test('a dead sender’s claim on a letter has ended before its job comes back to the queue', () => {
  for (const beatMs of [200, 5_000]) {
    const { claimMs, renewMs, goneAfterMs } = workerLimits(beatMs);
    // The last beat may be one beat older than the last renewal.
    expect(claimMs).toBeLessThanOrEqual(goneAfterMs - beatMs);
    expect(renewMs * 1.5).toBeLessThan(claimMs);
  }
});
