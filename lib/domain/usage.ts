/**
 * What a unit ran on each day, read out of its meter: the material that forecasts are made of.
 *
 * Days are those of the unit's dock. A day on which the dock was shut, or the unit laid up, has no usage: what a
 * meter ran then (a delivery, a trial in the workshop) is told apart as `unplacedTenths`, so nothing is lost.
 */
import { type CalendarDay, dayOfNumber, numberOfDay } from './calendar-day';
import { isOpenOn, type Opening } from './season';

/** What a unit's meter came to on a day: true engine hours, in tenths. */
export type UsageReading = { on: CalendarDay; engineHoursTenths: number };
/** Days on which a unit was out of service on purpose, both included; null is open-ended. */
export type LayUpDays = { from: CalendarDay; to: CalendarDay | null };

export type UsageFacts = {
  /** In the order they were taken. Those of one day may be several. */
  readings: readonly UsageReading[];
  /** The day on which each outing came back, in any order. */
  outings: readonly CalendarDay[];
  layUps: readonly LayUpDays[];
  opening: Opening;
  /** The unit is still out since this day, so nothing is known from then on. */
  outSince?: CalendarDay | null;
  /** Not part of the result: it is not over yet. */
  today: CalendarDay;
};

/** Usage day by day from `from` on: of each day its tenths of an hour (not whole), its outings, whether it counts. */
export type DailyUsage = {
  from: CalendarDay;
  tenths: number[];
  outings: number[];
  /** Whether the unit could have been hired: the dock open and the unit not laid up. */
  open: boolean[];
  /** What ran on no day that counts: with the tenths of all days, today's too, all that the meter ran. */
  unplacedTenths: number;
};

/**
 * The daily usage from the day of the first reading to yesterday, or null without a reading.
 *
 * What ran between two readings is shared equally by the outings that came back between them, each on its day;
 * without one, by the open days since the first of the two, that day itself only where both are of one day. An
 * interval of 6.0 h over a weekend without outings, dock open every day: 3.0 h on each day.
 *
 * No reading is no running, for every check-in brings one: days after the last are zero. Of a unit whose outings
 * are not recorded that cannot be said, so its days end with its last reading.
 */
export function computeDailyUsage(facts: UsageFacts): DailyUsage | null {
  const [first] = facts.readings;
  const last = facts.readings.at(-1);
  if (!first || !last) return null;
  const from = numberOfDay(first.on);
  const withToday = Math.max(numberOfDay(facts.today), numberOfDay(last.on)) + 1 - from;
  const open = computeOpenDays(facts, from, withToday);
  const usage: DailyUsage = {
    from: first.on,
    tenths: Array<number>(withToday).fill(0),
    outings: countOutings(facts.outings, from, open),
    open,
    unplacedTenths: 0,
  };
  let earlier = 0;
  facts.readings.forEach((reading, index) => {
    const later = numberOfDay(reading.on) - from;
    if (index > 0) spread(usage, earlier, later, ranOf(facts.readings[index - 1]!, reading));
    earlier = later;
  });
  const known = Math.max(0, endOfKnown(facts, last.on) - from);
  for (const days of [usage.tenths, usage.outings, usage.open]) days.length = known;
  return usage;
}

/** Days that were asked for already, by dock: every unit of a dock asks for the same ones. */
const asked = new WeakMap<Opening, Map<number, boolean>>();

/** Whether a dock hires out on the day of a day number; as `isOpenOn`, which it asks once a day. */
function isOpenOnNumber(opening: Opening, number: number): boolean {
  let known = asked.get(opening);
  if (!known) asked.set(opening, (known = new Map()));
  let open = known.get(number);
  if (open === undefined) known.set(number, (open = isOpenOn(opening, dayOfNumber(number))));
  return open;
}

/** Tenths between two readings of a unit's true running time, which does not fall. */
function ranOf(earlier: UsageReading, reading: UsageReading): number {
  const ran = reading.engineHoursTenths - earlier.engineHoursTenths;
  if (ran < 0) throw new RangeError(`engine hours fall from ${earlier.on} to ${reading.on}`);
  return ran;
}

/** The first day number of which nothing is known yet. */
function endOfKnown({ outings, outSince, today }: UsageFacts, lastOn: CalendarDay): number {
  const end = outings.length > 0 ? numberOfDay(today) : Math.min(numberOfDay(today), numberOfDay(lastOn) + 1);
  return outSince ? Math.min(end, numberOfDay(outSince)) : end;
}

/**
 * Whether a unit can be hired on each of `length` days from day number `from` on: its dock open, by season and
 * weekday, and the unit not laid up.
 */
export function computeOpenDays(
  { opening, layUps }: Pick<UsageFacts, 'opening' | 'layUps'>,
  from: number,
  length: number,
): boolean[] {
  const open = Array.from({ length }, (_, index) => isOpenOnNumber(opening, from + index));
  for (const layUp of layUps) {
    const start = Math.max(0, numberOfDay(layUp.from) - from);
    const end = layUp.to === null ? length : Math.min(length, numberOfDay(layUp.to) + 1 - from);
    if (start < end) open.fill(false, start, end);
  }
  return open;
}

function countOutings(outings: readonly CalendarDay[], from: number, open: readonly boolean[]): number[] {
  const counts = open.map(() => 0);
  for (const day of outings) {
    const index = numberOfDay(day) - from;
    if (open[index]) counts[index]! += 1;
  }
  return counts;
}

/** Shares out what ran after day `earlier` up to day `later` (indices), by outings, else by open days. */
function spread(usage: DailyUsage, earlier: number, later: number, ran: number): void {
  const { tenths, outings, open } = usage;
  const start = earlier === later ? later : earlier + 1;
  let [back, opened] = [0, 0];
  for (let index = start; index <= later; index += 1) {
    back += outings[index]!;
    opened += Number(open[index]);
  }
  if (back + opened === 0) usage.unplacedTenths += ran;
  for (let index = start; index <= later && opened > 0; index += 1) {
    const share = back > 0 ? outings[index]! / back : Number(open[index]) / opened;
    tenths[index]! += ran * share;
  }
}
