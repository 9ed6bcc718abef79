import { hoursText, KIND_WORDS } from '@/components/rules/due-words';
import { dayText, instantText } from '@/components/ui/time-text';
import type { HistoryEntry } from '@/lib/schemas/history';
import { SOURCE_WORDS } from './unit-words';

const by = (name: string | null) => (name ? ` by ${name}` : '');

/** The headline of an entry, the lines below it, and why it no longer counts when it does not. */
export type EntryWords = { title: string; lines: string[]; struck: string | null };

type Voided = { voidedAt: string | null; voidedBy: string | null; voidReason: string | null };

/** Says an entry of a unit's history in words; instants in the dock's time zone. */
export function historyWords(entry: HistoryEntry, timeZone: string): EntryWords {
  const moment = (at: string) => instantText(new Date(at), timeZone);
  const voiding = ({ voidedAt, voidedBy, voidReason }: Voided) =>
    voidedAt ? `Void since ${moment(voidedAt)}${by(voidedBy)}: ${voidReason ?? 'no reason given'}` : null;
  switch (entry.kind) {
    case 'outing':
      return { title: outingTitle(entry), lines: outingLines(entry, moment), struck: voiding(entry) };
    case 'reading':
      return {
        title: `${SOURCE_WORDS[entry.source]}: ${hoursText(entry.engineHours)}`,
        lines: readingLines(entry),
        struck: voiding(entry),
      };
    case 'meter_swap':
      return {
        title: `Meter swap at ${hoursText(entry.engineHours)}`,
        lines: [
          `Old meter ended at ${hoursText(entry.oldFinal)}` +
            (entry.newFirst === null ? '' : `, new one began at ${hoursText(entry.newFirst)}`) +
            by(entry.recordedBy),
        ],
        struck: voiding(entry),
      };
    case 'closure':
      return {
        title: `${entry.title} done at ${hoursText(entry.engineHours)}`,
        lines: [
          `${entry.taskKind === 'repair' ? 'Repair' : KIND_WORDS[entry.taskKind]} closed${by(entry.closedBy)}`,
          ...(entry.note ? [entry.note] : []),
        ],
        struck: entry.reversedAt
          ? `Reversed ${moment(entry.reversedAt)}${by(entry.reversedBy)}: ${entry.reverseReason ?? ''}`
          : null,
      };
    case 'defect':
      return { title: `Defect: ${entry.title}`, lines: defectLines(entry, moment), struck: null };
    case 'lay_up':
      return { title: 'Lay-up', lines: layUpLines(entry, moment), struck: null };
  }
}

type Of<Kind extends HistoryEntry['kind']> = Extract<HistoryEntry, { kind: Kind }>;
type Moment = (at: string) => string;

function outingTitle(entry: Of<'outing'>): string {
  if (!entry.endedAt) return entry.voidedAt ? 'Outing' : 'Out now';
  return entry.engineHours === null ? 'Outing' : `Outing, back at ${hoursText(entry.engineHours)}`;
}

function outingLines(entry: Of<'outing'>, moment: Moment): string[] {
  return [
    entry.startedAt ? `Out ${moment(entry.startedAt)}${by(entry.checkedOutBy)}` : 'Its start is not known',
    ...(entry.endedAt ? [`Back ${moment(entry.endedAt)}${by(entry.checkedInBy)}`] : []),
    `From ${entry.dockName}`,
  ];
}

function readingLines(entry: Of<'reading'>): string[] {
  const shown =
    entry.shownHours === entry.engineHours ? '' : `, meter showing ${hoursText(entry.shownHours)}`;
  return [
    `Recorded${by(entry.recordedBy)}${shown}`,
    ...(entry.confirmReason ? [`Confirmed: ${entry.confirmReason}`] : []),
    ...(entry.review && !entry.reviewedAt ? ['Waits for a manager to review it'] : []),
  ];
}

function defectLines(entry: Of<'defect'>, moment: Moment): string[] {
  const cleared = entry.clearedAt
    ? `Cleared ${moment(entry.clearedAt)}${by(entry.clearedBy)}${entry.clearNote ? `: ${entry.clearNote}` : ''}`
    : entry.holdsUnit
      ? 'Open, and holds the unit'
      : 'Open';
  return [
    ...(entry.detail ? [entry.detail] : []),
    ...(entry.reportedBy ? [`Reported by ${entry.reportedBy}`] : []),
    cleared,
  ];
}

function layUpLines(entry: Of<'lay_up'>, moment: Moment): string[] {
  return [
    `From ${dayText(entry.fromOn)}${entry.untilOn ? ` to ${dayText(entry.untilOn)}` : ' until somebody ends it'}`,
    `${entry.reason}${entry.recordedBy ? ` (recorded by ${entry.recordedBy})` : ''}`,
    ...(entry.endedAt ? [`Ended ${moment(entry.endedAt)}`] : []),
  ];
}
