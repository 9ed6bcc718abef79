import { parseMeasured } from '@/lib/domain/measured-value';
import type { EntryValue, Stage, Step, StepEntry } from '@/lib/domain/procedure';
import type { KeptEntry } from '@/lib/client/outbox';
import type { Entry, EntryInput } from '@/lib/schemas/work';

/** Where on the bench something is entered. */
export type Spot = { step: Step; place: number; stage: Stage | null };

/** An entry as the bench shows it: `waiting` while only this device has it. */
export type BenchEntry = Omit<Entry, 'judged' | 'followsId'> & { waiting: boolean };

/** What was typed as it will be kept; null for a run that cannot be read. */
export function readEntry(step: Step | undefined, value: EntryInput): EntryValue | null {
  if (value.kind !== 'measurement') return value;
  const runs = value.runs.map(({ typed, unit }) => parseMeasured(typed, unit ?? step?.measures?.unit ?? ''));
  if (runs.some((run) => 'fault' in run)) return null;
  return { ...value, runs: runs.flatMap((run) => ('fault' in run ? [] : [run])) };
}

/** All entries in their order: those that the server has, then those that are on their way to it. */
export function joinEntries(
  entries: readonly Entry[],
  kept: readonly KeptEntry[],
  steps: readonly Step[],
  me: { id: string; name: string },
): BenchEntry[] {
  const known = new Set(entries.map(({ id }) => id));
  const waiting = kept
    .filter(({ id, refused, file }) => !file && refused === null && !known.has(id))
    .flatMap((entry): BenchEntry[] => {
      const body = entry.body as unknown as {
        stepKey: string;
        place: number;
        stage?: Stage;
        value: EntryInput;
      };
      const value = readEntry(
        steps.find(({ key }) => key === body.stepKey),
        body.value,
      );
      if (!value) return [];
      return [
        {
          id: entry.id,
          stepKey: body.stepKey,
          place: body.place,
          stage: body.stage ?? null,
          value,
          enteredAt: entry.madeAt,
          enteredBy: me,
          waiting: true,
        },
      ];
    });
  return [...entries.map((entry) => ({ ...entry, waiting: false })), ...waiting];
}

/** What was entered at a spot, the first first. */
export function entriesAt<T extends Pick<StepEntry, 'stepKey' | 'place' | 'stage'>>(
  entries: readonly T[],
  { step, place, stage }: Spot,
): T[] {
  return entries.filter((one) => one.stepKey === step.key && one.place === place && one.stage === stage);
}
