import type { Digest, DockDigest } from './digest';
import { formatTenths } from './meter';
import { countOf, describeDay, joinWords } from './words';

/** Addresses that the letter links to; `page` makes the whole address of a path of ours. */
export type DigestLinks = { page: (path: string) => string; unsubscribe: string };

/** One line of a list: a unit, where it leads, and what is said of it. */
export type LetterLine = { unit: string; path: string; text: string };
export type LetterSection = { title: string; note?: string; lines: LetterLine[]; none: string };

/** What stands in the subject and at the head: the counts, the worst first. */
export function describeTotals({ totals }: Digest): string {
  const parts = [
    totals.overdue > 0 && `${totals.overdue} overdue`,
    totals.held > 0 && `${totals.held} held`,
    totals.daysLost > 0 && `${countOf(totals.daysLost, 'day')} of hire lost`,
    totals.due > 0 && `${totals.due} due this week`,
  ].filter((part) => part !== false);
  return parts.length > 0 ? joinWords(parts) : 'nothing overdue, held or due this week';
}

/** 'Week of Mon 30 Nov 2026: 3 overdue and 1 held'. */
export function digestSubject(digest: Digest): string {
  return `Week of ${describeDay(digest.weekOn)}: ${describeTotals(digest)}`;
}

/** What the letter says of one dock, in order: what is late, what that costs, what comes, what was done. */
export function digestSections(digest: Digest, dock: DockDigest): LetterSection[] {
  const week = `${describeDay(digest.from)} to ${describeDay(digest.to)}`;
  return [
    {
      title: 'Overdue',
      lines: dock.overdue.map((line) => ({
        unit: line.fleetNumber,
        path: `/units/${line.unitId}`,
        text: `${line.ruleName}: overdue ${line.late}${line.holdsUnit ? '; holds the unit' : ''}`,
      })),
      none: 'Nothing is overdue.',
    },
    {
      title: 'Held, and days of hire lost',
      note: `${countOf(dock.daysLost, 'day')} of hire lost from ${week}. A day counts when the dock was open and the unit was held at noon.`,
      lines: dock.held.map((line) => ({
        unit: line.fleetNumber,
        path: `/units/${line.unitId}`,
        text: [
          line.since ? `held since ${describeDay(line.since)}` : 'not held any more',
          ...(line.reasons.length > 0 ? [joinWords(line.reasons)] : []),
          `${countOf(line.daysLost, 'day')} lost`,
        ].join('; '),
      })),
      none: 'No unit is held, and no day of hire was lost.',
    },
    {
      title: 'Due in the next seven days',
      lines: dock.due.map((line) => ({
        unit: line.fleetNumber,
        path: `/units/${line.unitId}`,
        text: `${line.ruleName}: due ${line.when}`,
      })),
      none: 'Nothing is due by date, or by hours and outings at the pace of the last four weeks.',
    },
    {
      title: 'Closed last week',
      lines: dock.closed.map((line) => ({
        unit: line.fleetNumber,
        path: `/tasks/${line.taskId}`,
        text: `${line.title}: closed ${describeDay(line.closedOn)} at ${formatTenths(line.engineHoursTenths)} h${line.closedBy ? ` by ${line.closedBy}` : ''}`,
      })),
      none: `No task was closed from ${week}.`,
    },
  ];
}

/** The letter as plain text. */
export function digestText(digest: Digest, links: DigestLinks): string {
  const out = [
    `Week of ${describeDay(digest.weekOn)}`,
    `${capital(describeTotals(digest))}.`,
    ...digest.docks.flatMap((dock) => [
      '',
      `== ${dock.name} ==`,
      ...digestSections(digest, dock).flatMap((section) => [
        '',
        section.title,
        ...(section.note ? [section.note] : []),
        ...(section.lines.length > 0
          ? section.lines.map((line) => `- ${line.unit}: ${line.text}\n  ${links.page(line.path)}`)
          : [section.none]),
      ]),
    ]),
    '',
    `All of it as it stands now: ${links.page('/digest')}`,
    `No more of these letters: ${links.unsubscribe}`,
  ];
  return `${out.join('\n')}\n`;
}

/** The text with its first letter as a capital. */
export const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);
