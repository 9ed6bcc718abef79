/** Chance that comes out the same every time: a stream of numbers that follows from a text alone. */
export type Chance = {
  /** A number from 0 up to 1. */
  next(): number;
  /** A number from `low` up to `high`. */
  between(low: number, high: number): number;
  /** A whole number from `low` to `high`, both included. */
  whole(low: number, high: number): number;
  /** True with this probability. */
  happens(probability: number): boolean;
  pick<T>(items: readonly T[]): T;
  /** An id in the shape of a random UUID. */
  uuid(): string;
};

/** FNV-1a, 32 bits. */
function hashText(text: string): number {
  let hash = 0x811c9dc5;
  for (const character of text) {
    hash = Math.imul(hash ^ character.codePointAt(0)!, 0x01000193);
  }
  return hash >>> 0;
}

/** The stream of a text (mulberry32 from its hash). */
export function chanceOf(text: string): Chance {
  let state = hashText(text);
  const next = () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4_294_967_296;
  };
  const whole = (low: number, high: number) => low + Math.floor(next() * (high - low + 1));
  return {
    next,
    between: (low, high) => low + next() * (high - low),
    whole,
    happens: (probability) => next() < probability,
    pick: (items) => items[whole(0, items.length - 1)]!,
    uuid: () => {
      const hex = Array.from({ length: 32 }, () => whole(0, 15).toString(16));
      hex[12] = '4';
      hex[16] = '89ab'[whole(0, 3)]!;
      const text = hex.join('');
      return [0, 8, 12, 16, 20].map((from, i, all) => text.slice(from, all[i + 1])).join('-');
    },
  };
}

/** How often something happens that happens `mean` times on average and independently (Poisson). */
export function countOf(mean: number, chance: Chance): number {
  const limit = Math.exp(-mean);
  let product = chance.next();
  let count = 0;
  while (product > limit) {
    product *= chance.next();
    count += 1;
  }
  return count;
}
