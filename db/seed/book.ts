import type { Kysely } from 'kysely';
import { listDuePoints } from '@/db/queries/due-points';
import type { DB } from '@/db/tables';
import { checkIn } from '@/lib/actions/check-in';
import { checkOut } from '@/lib/actions/check-out';
import { closeTask } from '@/lib/actions/close-task';
import { openTask } from '@/lib/actions/open-task';
import { openTasks } from '@/lib/actions/open-tasks';
import { refreshDue } from '@/lib/actions/refresh-due';
import type { Context } from '@/lib/context';
import { SYSTEM, type Actor } from '@/lib/domain/access';
import { startOfLocalDay, type CalendarDay } from '@/lib/domain/calendar-day';
import { computeState, type DuePoint, type DueState, type Standing } from '@/lib/domain/due';
import type { CreateCheckIn } from '@/lib/schemas/check-in';
import type { Rule } from '@/lib/schemas/rule';
import { findAllInOrder } from './findings';
import type { Crew } from './people';
import { chanceOf, type Chance } from './random';

export type OpenWork = { id: string; ruleId: string | null; defectId: string | null };
export type Watched = { rule: Rule; point: DuePoint };

/** A unit while its history is being written: where it stands, and the actions that write. */
export type Book = {
  db: Kysely<DB>;
  unitId: string;
  fleetNumber: string;
  timeZone: string;
  crew: Crew;
  rules: ReadonlyMap<string, Rule>;
  chance: Chance;
  /** Nothing is written that would be later than this. */
  end: Date;
  engineHoursTenths: number;
  baseTenths: number;
  outings: number;
  points: Watched[];
  work: OpenWork[];
  /** When anything was last written of it, and when its meter was last read. */
  lastAt: Date;
  lastReadAt: Date;
};

const midnights = new Map<string, number>();

/** An instant of a dock's day: minutes after its midnight. */
export function instantOf(timeZone: string, day: CalendarDay, minute: number): Date {
  const key = `${timeZone} ${day}`;
  let midnight = midnights.get(key);
  if (midnight === undefined) {
    midnight = startOfLocalDay(day, timeZone).getTime();
    midnights.set(key, midnight);
  }
  return new Date(midnight + minute * 60_000);
}

export const as = (book: Book, actor: Actor, now: Date): Context => ({ db: book.db, actor, now });

/** Has the unit's due points computed and its tasks opened, as the worker would have at this instant. */
export async function assess(book: Book, now: Date): Promise<void> {
  await refreshDue(as(book, SYSTEM, now), { unitIds: [book.unitId] });
  const stored = await listDuePoints(book.db, book.unitId);
  book.points = stored
    .map(({ ruleId, point }) => ({ rule: book.rules.get(ruleId)!, point }))
    .sort((a, b) => (a.rule.name < b.rule.name ? -1 : 1));
  await readWork(book);
}

/** Opens what has come within its lead, as the worker would have at this instant. */
export async function openWork(book: Book, now: Date): Promise<void> {
  await openTasks(as(book, SYSTEM, now), [book.unitId]);
  await readWork(book);
}

async function readWork(book: Book): Promise<void> {
  const rows = await book.db
    .selectFrom('task')
    .select(['id', 'rule_id', 'defect_id'])
    .where('unit_id', '=', book.unitId)
    .where('ended_at', 'is', null)
    .orderBy('opened_at')
    .orderBy('title')
    .execute();
  book.work = rows.map((row) => ({ id: row.id, ruleId: row.rule_id, defectId: row.defect_id }));
}

export function standingOf(book: Book, today: CalendarDay): Standing {
  return { engineHoursTenths: book.engineHoursTenths, outings: book.outings, today };
}

export function stateOf(book: Book, { point }: Watched, today: CalendarDay): DueState {
  return computeState(point, standingOf(book, today));
}

/** Whether a rule holds the unit as it stands. */
export function isOverdue(book: Book, today: CalendarDay): boolean {
  return book.points.some((watched) => watched.rule.holdsUnit && stateOf(book, watched, today) === 'overdue');
}

/** Closes one task of the unit, or the one opened for a rule ahead of its lead. */
export async function close(book: Book, work: Pick<OpenWork, 'id'>, now: Date): Promise<void> {
  const { chance, crew } = book;
  const note = chance.happens(0.3) ? chance.pick(NOTES) : undefined;
  const ctx = as(book, crew.mechanic, now);
  await closeTask(ctx, work.id, {
    results: await findAllInOrder(ctx, work.id, chanceOf(`${book.fleetNumber} at ${now.toISOString()}`)),
    minutes: chance.whole(3, 24) * 5,
    ...(note && { note }),
  });
  book.lastAt = now;
}

/** Does a rule's work now, whether its task is open yet or not. */
export async function doWork(book: Book, rule: Rule, now: Date): Promise<void> {
  const ctx = as(book, book.crew.mechanic, now);
  const open = book.work.find(({ ruleId }) => ruleId === rule.id);
  await close(book, open ?? (await openTask(ctx, { unitId: book.unitId, ruleId: rule.id })), now);
}

type Return = Pick<CreateCheckIn, 'defect' | 'confirmReason'> & { tenths: number };

/** Checks the unit in: the meter has gone on by so many tenths. Answers the reading's id. */
export async function bringBack(book: Book, at: Date, { tenths, ...rest }: Return): Promise<string> {
  const id = book.chance.uuid();
  book.engineHoursTenths += tenths;
  book.outings += 1;
  const hours = (book.engineHoursTenths - book.baseTenths) / 10;
  await checkIn(as(book, book.chance.pick(book.crew.hands), at), { id, unitId: book.unitId, hours, ...rest });
  book.lastAt = at;
  book.lastReadAt = at;
  return id;
}

/** Hires the unit out until an instant. */
export async function sendOut(
  book: Book,
  at: Date,
  dueBackAt: Date,
  renterReference?: string,
): Promise<void> {
  const hand = book.chance.pick(book.crew.hands);
  await checkOut(as(book, hand, at), {
    id: book.chance.uuid(),
    unitId: book.unitId,
    dueBackAt,
    ...(renterReference && { renterReference }),
  });
  book.lastAt = at;
}

const NOTES = [
  'All in order.',
  'Cleaned and adjusted, ran up on the trailer.',
  'Wear within limits. Look again next time.',
  'Replaced the worn part, the rest in order.',
  'Clamp retightened.',
  'Some salt inside; rinsed and sprayed.',
  'Needle and seat replaced, pressure steady.',
  'Done between two hires; tested at the dock.',
];
