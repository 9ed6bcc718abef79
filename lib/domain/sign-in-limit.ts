/**
 * How long somebody who guesses passwords has to wait.
 *
 * Wrong attempts are counted over a sliding window. The first few cost nothing; from then on each further one
 * doubles the wait. Three counters exist: the account and the address of the network for browsers never seen,
 * and the device for a browser on which this person has signed in before. A known device answers to its own
 * counter alone, so somebody else's guesses do not lock out the owner.
 */
export type Ladder = {
  windowMs: number;
  /** Wrong attempts inside the window that cost no wait. */
  free: number;
  firstWaitMs: number;
  longestWaitMs: number;
};

const MINUTE_MS = 60_000;
const HOUR_MS = 60 * MINUTE_MS;

/** Five slips a day are human. At most about thirty guesses a day against one account. */
const ACCOUNT: Ladder = {
  windowMs: 24 * HOUR_MS,
  free: 5,
  firstWaitMs: MINUTE_MS,
  longestWaitMs: HOUR_MS,
};

/** An address may stand for a whole office behind one router, so it is given more. */
const ADDRESS: Ladder = { ...ACCOUNT, free: 30 };

export const SIGN_IN_LADDERS = { account: ACCOUNT, address: ADDRESS, device: ACCOUNT } as const;

/** The longest time for which an attempt matters to any counter. */
export const ATTEMPT_MATTERS_MS = 24 * HOUR_MS;

/**
 * Milliseconds until the next attempt is taken; 0 when it is taken now. Failures at or before `now` − window do
 * not count. The n-th beyond the free ones asks for `firstWaitMs` · 2ⁿ after the latest failure, at most
 * `longestWaitMs`; at exactly that instant the attempt is taken.
 *
 * With 5 free and a first wait of 1 min, the 5th failure asks for 1 min, the 6th for 2, the 7th for 4.
 */
export function computeWaitMs(ladder: Ladder, failures: readonly Date[], now: Date): number {
  const times = failures.map((at) => at.getTime()).filter((at) => at > now.getTime() - ladder.windowMs);
  if (times.length < ladder.free) return 0;
  const wait = Math.min(ladder.longestWaitMs, ladder.firstWaitMs * 2 ** (times.length - ladder.free));
  return Math.max(0, Math.max(...times) + wait - now.getTime());
}

/**
 * What of a network address is counted: an IPv4 address whole (also when written inside IPv6), an IPv6 address
 * by its /64, which is what one household or one attacker is given.
 */
export function countedAddress(address: string): string {
  const text = address.trim().toLowerCase().replace(/%.*$/, '');
  const mapped = /^::ffff:(\d+\.\d+\.\d+\.\d+)$/.exec(text)?.[1];
  if (mapped) return mapped;
  if (!text.includes(':')) return text;
  const [head = '', tail] = text.split('::');
  const before = head ? head.split(':') : [];
  const after = tail ? tail.split(':') : [];
  const missing = tail === undefined ? 0 : Math.max(0, 8 - before.length - after.length);
  const groups = [...before, ...Array<string>(missing).fill('0'), ...after];
  return `${groups
    .slice(0, 4)
    .map((group) => group.replace(/^0+(?=.)/, ''))
    .join(':')}::/64`;
}
