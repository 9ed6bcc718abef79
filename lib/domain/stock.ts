import type { OnlyPlace, Per } from './procedure';
import type { PartNeed, UnitCounts } from './rule';

/** So many of one part. Parts are counted in whole numbers. */
export type PartCount = { partId: string; quantity: number };

/** Why stock moved. `taken` and `put_back` belong to a closure. */
export type MoveKind =
  'received' | 'counted' | 'moved_in' | 'moved_out' | 'made_up' | 'broken_up' | 'taken' | 'put_back';

/** What lies at one dock of one part: `reserved` of it is set aside for tasks. Below zero when a count is owed. */
export type Level = { onHand: number; reserved: number };

/**
 * How many of each part the work on one unit takes, a part named twice added up, needs of none left out: a kit for
 * each of 3 carburettors is 3. Work on one place only takes what is per that place, once: a kit for carburettor 2
 * is 1, and what the unit or its cylinders take is not part of it.
 */
export function computeNeeds(
  needs: readonly PartNeed[],
  unit: UnitCounts,
  only: OnlyPlace | null = null,
): PartCount[] {
  const times: Record<Per, number> = {
    unit: 1,
    engine: unit.engines,
    cylinder: unit.cylinders,
    carb: unit.carbCount,
  };
  const scaled = needs.map(({ partId, quantity, per }) => ({
    partId,
    quantity: quantity * (only === null ? times[per] : Number(only.per === per)),
  }));
  return addUp(scaled);
}

/** What a task needs: what its rule asks for, but where somebody said how many of a part, that many. */
export function computeTaskNeeds(asked: readonly PartCount[], said: readonly PartCount[]): PartCount[] {
  const saidOf = new Set(said.map(({ partId }) => partId));
  return addUp([...asked.filter(({ partId }) => !saidOf.has(partId)), ...said]);
}

/** Each part once, parts of which there are none left out, in the order they were first named. */
function addUp(counts: readonly PartCount[]): PartCount[] {
  const quantities = new Map<string, number>();
  for (const { partId, quantity } of counts) quantities.set(partId, (quantities.get(partId) ?? 0) + quantity);
  return [...quantities]
    .filter(([, quantity]) => quantity > 0)
    .map(([partId, quantity]) => ({ partId, quantity }));
}

/** What is on hand and set aside for no task; never below zero. */
export function computeFree({ onHand, reserved }: Level): number {
  return Math.max(0, onHand - reserved);
}

/** Whether a part is low: its mark is reached (≤) by what is free, so parts set aside are as good as gone. */
export function isLow(level: Level, lowAt: number | null): boolean {
  return lowAt !== null && level.onHand - level.reserved <= lowAt;
}

/** How many kits can be made up of what is free of their contents; none of a kit of nothing. */
export function computeKits(contents: readonly PartCount[], freeOf: (partId: string) => number): number {
  if (contents.length === 0) return 0;
  return Math.min(...contents.map(({ partId, quantity }) => Math.floor(freeOf(partId) / quantity)));
}

/** How many to set aside for a task that needs so many, has some already and may take what is free. */
export function computeReservation(needed: number, has: number, free: number): number {
  return Math.max(0, Math.min(needed - has, free));
}

/**
 * Why so many cannot be taken without a stated reason, or null when they can: more than is on hand would bring the
 * stock below zero, more than is free takes what is set aside for another task. `reserved` is what others have.
 */
export function checkTaking(level: Level, quantity: number): string | null {
  const { onHand, reserved } = level;
  if (quantity <= onHand - reserved) return null;
  if (quantity > onHand)
    return onHand > 0
      ? `only ${onHand} on hand: say why more were taken`
      : 'none on hand: say why it was taken all the same';
  return `${reserved} of ${onHand} on hand are reserved for other work: say why they are taken`;
}
