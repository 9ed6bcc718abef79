import { renewMailClaim } from '@/db/queries/mail';
import type { Context } from '@/lib/context';

export type MailClaim = {
  /** Whether the claim holds at this moment, by a clock that runs on while the process is stopped. */
  holds: () => boolean;
  /** Aborted when the claim was lost. */
  signal: AbortSignal;
};

type Options = { mailId: string; claimId: string; claimedAt: number; claimMs: number; renewMs: number };

/** Renews a claim until `stop()`. A renewal that fails, or comes too late, loses it. */
export function keepMailClaim(
  { db }: Context,
  { mailId, claimId, claimedAt, claimMs, renewMs }: Options,
): MailClaim & { stop(): Promise<void> } {
  const lost = new AbortController();
  let holdsUntil = claimedAt + claimMs;
  let renewal = Promise.resolve();
  const holds = () => !lost.signal.aborted && performance.now() < holdsUntil;

  async function renew(): Promise<void> {
    const asked = performance.now();
    const kept = holds() && (await renewMailClaim(db, mailId, claimId).catch(() => false));
    if (kept) holdsUntil = asked + claimMs;
    else lost.abort(new Error('the claim on the letter was lost'));
  }
  const timer = setInterval(() => (renewal = renewal.then(renew)), renewMs);
  return {
    holds,
    signal: lost.signal,
    stop: async () => {
      clearInterval(timer);
      await renewal;
    },
  };
}
