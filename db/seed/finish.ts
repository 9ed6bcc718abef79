import { addTaskNote } from '@/lib/actions/add-task-note';
import { changeTask } from '@/lib/actions/change-task';
import { getAvailability } from '@/lib/actions/get-availability';
import { logReading } from '@/lib/actions/log-reading';
import { openTask } from '@/lib/actions/open-task';
import { SYSTEM } from '@/lib/domain/access';
import { addDays, localDay } from '@/lib/domain/calendar-day';
import { as, instantOf, sendOut, type Book } from './book';
import { DOCKS } from './docks';
import { isOpen } from './season';

const MINUTE = 60_000;
const NOTES = [
  'Parts are on the shelf.',
  'Renter says it hesitates when it is warm; look at the needle first.',
  'Take the spare lanyard along.',
];

/** What is going on at the end: units out, work planned and begun, notes on it. */
export async function writeTheDay(
  books: readonly Book[],
  dockIds: readonly string[],
  now: Date,
): Promise<void> {
  await runUpTheResting(books, now);
  for (const [index, dockId] of dockIds.entries()) {
    const here = books.filter(({ fleetNumber }) => fleetNumber.startsWith(DOCKS[index]!.letter));
    await sendSomeOut(here, dockId, DOCKS[index]!, now);
    await planWork(here, now);
  }
}

/** Engines of a dock that is shut are run up every few days, and their meters read. */
async function runUpTheResting(books: readonly Book[], now: Date): Promise<void> {
  for (const book of books) {
    const yesterday = addDays(localDay(now, book.timeZone), -1);
    const at = instantOf(book.timeZone, yesterday, 10 * 60);
    if (at <= book.lastAt || now.getTime() - book.lastReadAt.getTime() < 9 * 86_400_000) continue;
    book.engineHoursTenths += 1;
    const hours = (book.engineHoursTenths - book.baseTenths) / 10;
    await logReading(as(book, book.crew.mechanic, at), {
      id: book.chance.uuid(),
      unitId: book.unitId,
      hours,
    });
    book.lastAt = at;
  }
}

/** While a dock is open two of its units are out; one of the first dock's is late. */
async function sendSomeOut(
  books: readonly Book[],
  dockId: string,
  dock: (typeof DOCKS)[number],
  now: Date,
): Promise<void> {
  const { timeZone } = dock.input;
  const today = localDay(now, timeZone);
  const opens = instantOf(timeZone, today, 9 * 60 + 30);
  const shuts = instantOf(timeZone, today, 18 * 60 + 30);
  if (!isOpen(dock, today) || now > shuts) return;
  const ctx = { db: books[0]!.db, actor: SYSTEM, now };
  const { ready } = await getAvailability(ctx, { dockId, hours: 3 });
  const ashore = ready.map(({ unitId }) => books.find((book) => book.unitId === unitId)!);
  const minutesOpen = (now.getTime() - opens.getTime()) / MINUTE;
  const hires =
    minutesOpen < 30
      ? []
      : [
          { since: Math.min(minutesOpen, 130), dueIn: dock.letter === 'G' ? -15 : 35 },
          { since: Math.min(minutesOpen, 45), dueIn: 75 },
        ];
  let from = 0;
  for (const { since, dueIn } of hires) {
    const at = new Date(now.getTime() - Math.floor(since) * MINUTE);
    const due = new Date(Math.max(now.getTime() + dueIn * MINUTE, at.getTime() + 10 * MINUTE));
    from = ashore.findIndex((book, index) => index >= from && book.lastAt < at);
    if (from < 0) return;
    await sendOut(ashore[from]!, at, due, `Slip order ${ashore[from]!.chance.whole(2000, 9000)}`);
    from += 1;
  }
}

/** Some of the open tasks are planned over the next two weeks, one is begun, and an ad-hoc repair is in hand. */
async function planWork(books: readonly Book[], now: Date): Promise<void> {
  let planned = 0;
  for (const book of books) {
    const today = localDay(now, book.timeZone);
    const ctx = as(book, book.crew.mechanic, now);
    for (const work of book.work) {
      if (book.chance.happens(0.45)) continue;
      const plannedOn = addDays(today, book.chance.whole(0, 13));
      await changeTask(ctx, work.id, { plannedOn, ...(planned === 0 && { started: true }) });
      if (planned < NOTES.length) await addTaskNote(ctx, work.id, { text: NOTES[planned]! });
      planned += 1;
    }
  }
  const last = books.at(-2)!;
  const ctx = as(last, last.crew.mechanic, now);
  const repair = await openTask(ctx, {
    unitId: last.unitId,
    kind: 'repair',
    title: 'Refit the loose rubbing strake',
    detail: 'Came off at the stern when mooring. Glue is in the workshop.',
    plannedOn: localDay(now, last.timeZone),
  });
  await changeTask(ctx, repair.id, { started: true });
}
