/**
 * What the shelf must hold: demand to come with its spread, reorder points, and by when to order. Quantities of parts
 * are whole; demand is an expectation and need not be.
 */
import { addDays, type CalendarDay, daysBetween } from './calendar-day';
import { normalQuantile } from './normal';

/** Demand of one day, or of one lead time: its mean and its variance. */
export type Demand = { mean: number; variance: number };

/**
 * Safety stock and reorder point: z √(L σ² + d² σ_L²), and d L more (E. A. Silver, D. F. Pyke and R. Peterson,
 * Inventory Management and Production Planning, 1998, chapter 7: demand and lead time independent, both normal).
 *
 * 5 a day, σ 2, 3 days, 95 %: safety stock 5.70, reorder at 20.7. Throws RangeError unless 0 < serviceLevel < 1.
 */
export function computeReorderPoint(facts: {
  perDay: number;
  spreadPerDay: number;
  leadDays: number;
  leadSpreadDays?: number;
  serviceLevel: number;
}): { safetyStock: number; reorderPoint: number } {
  const { perDay, spreadPerDay, leadDays, leadSpreadDays = 0, serviceLevel } = facts;
  const variance = leadDays * spreadPerDay ** 2 + (perDay * leadSpreadDays) ** 2;
  const safetyStock = Math.max(0, normalQuantile(serviceLevel)) * Math.sqrt(variance);
  return { safetyStock, reorderPoint: perDay * leadDays + safetyStock };
}

/**
 * A duty to come that wants so many of a part, and the chance that it comes by the end of each day from today on
 * (index 0): what `computeChances` of its meter gives, or 0 before and 1 from the day of a fixed date on.
 */
export type PlannedUse = { quantity: number; chanceBy: ArrayLike<number> };

/**
 * Demand from today to the end of each day: each duty wants its quantity or nothing, independent of the others, and
 * repairs want `unplannedPerDay` on top as a Poisson process. The variance of a duty is p (1 − p) quantity².
 */
export function computeDemand(uses: readonly PlannedUse[], unplannedPerDay: number, days: number): Demand[] {
  return Array.from({ length: days }, (_, ahead) => {
    const unplanned = unplannedPerDay * (ahead + 1);
    return uses.reduce(
      ({ mean, variance }, { quantity, chanceBy }) => {
        const chance = chanceBy[Math.min(ahead, chanceBy.length - 1)] ?? 0;
        return {
          mean: mean + quantity * chance,
          variance: variance + quantity ** 2 * chance * (1 - chance),
        };
      },
      { mean: unplanned, variance: unplanned },
    );
  });
}

/** What must be there to serve a demand at a level: mean + z σ, rounded up; none below nothing. */
export function computeNeed({ mean, variance }: Demand, serviceLevel: number): number {
  return Math.max(0, Math.ceil(mean + normalQuantile(serviceLevel) * Math.sqrt(variance) - 1e-9));
}

export type StockFacts = {
  today: CalendarDay;
  onHand: number;
  /** Ordered and expected on these days; what is late counts as coming today. */
  arrivals: readonly { on: CalendarDay; quantity: number }[];
  /** From today to the end of each day, as `computeDemand` gives it. */
  demand: readonly Demand[];
  leadDays: number;
  /** How long one order is to last once it has come. */
  coverDays: number;
  serviceLevel: number;
};

/**
 * When the shelf no longer serves at the wanted level, by when to order so that it does, and how many. Already too
 * late when `orderBy` is before today. Null when it lasts as far as the demand is known.
 */
export type OrderAdvice = { shortOn: CalendarDay; orderBy: CalendarDay; quantity: number };

/**
 * The first day by whose end the need at the service level exceeds what is on hand and will have come; the order must
 * be placed the lead time before. It makes up the most that is missing from then until the cover ends.
 */
export function adviseOrder(facts: StockFacts): OrderAdvice | null {
  const { today, demand, leadDays, coverDays, serviceLevel } = facts;
  const missing = demand.map((day, ahead) => computeNeed(day, serviceLevel) - comeBy(facts, ahead));
  const first = missing.findIndex((quantity) => quantity > 0);
  if (first < 0) return null;
  const covered = missing.slice(first, Math.max(first, leadDays) + coverDays + 1);
  return {
    shortOn: addDays(today, first),
    orderBy: addDays(today, first - leadDays),
    quantity: Math.max(...covered),
  };
}

const comeBy = ({ today, onHand, arrivals }: StockFacts, ahead: number) =>
  arrivals.reduce((sum, { on, quantity }) => sum + (daysBetween(today, on) <= ahead ? quantity : 0), onHand);
