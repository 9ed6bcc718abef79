/** How often a worker shows that it lives, and what follows from it. All in milliseconds. */
export type WorkerLimits = {
  beatMs: number;
  /** Without a beat for so long a worker is taken for dead, and its jobs go to others. */
  goneAfterMs: number;
  /** How often an idle worker looks for jobs that nobody told it of, such as those of a dead one. */
  pollMs: number;
  /** A letter's claim holds so long unless renewed: less than it takes for a dead sender's job to come back. */
  claimMs: number;
  renewMs: number;
};

/** A crashed worker's jobs are taken up again within this time. */
export const TAKEN_UP_WITHIN_MS = 30_000;

/** The limits that follow from a beat every `beatMs`: dead after three beats missed. */
export function workerLimits(beatMs: number): WorkerLimits {
  return {
    beatMs,
    goneAfterMs: 3 * beatMs,
    pollMs: Math.min(2_000, beatMs),
    claimMs: 2 * beatMs,
    renewMs: Math.floor(0.6 * beatMs),
  };
}

/**
 * The longest time from a worker's death until a living one begins its jobs: its last beat has to grow old, the
 * next look for dead workers comes one beat later at most, and the next look for jobs one poll after that.
 */
export function longestUntilTakenUpMs({ beatMs, goneAfterMs, pollMs }: WorkerLimits): number {
  return goneAfterMs + beatMs + pollMs;
}
