import type { FollowUpRow, listSignOffs } from '@/db/queries/bench';
import type { StepEntryRow } from '@/db/queries/step-entries';
import type { Entry, FollowUp, SignOff } from '@/lib/schemas/work';
import { toNamed } from './shape-task';

/** An entry as the API and the screens show it. */
export function toEntry(row: StepEntryRow): Entry {
  return {
    id: row.id,
    stepKey: row.step_key,
    place: row.place,
    stage: row.stage,
    value: row.value,
    judged: row.judged,
    followsId: row.follows_id,
    enteredAt: row.entered_at.toISOString(),
    enteredBy: toNamed(row.entered_by, row.author_name),
  };
}

/** The follow-ups of a task, each once: of a defect that had several tasks, with the latest. */
export function toFollowUps(rows: readonly FollowUpRow[]): FollowUp[] {
  const byOrigin = new Map<string, FollowUp>();
  for (const row of rows) {
    const done = row.task_closed;
    const open = row.defect_id ? row.defect_open : row.task_open;
    byOrigin.set(row.defect_id ?? row.task_id ?? '', {
      stepKey: row.step_key,
      place: row.place,
      title: row.title,
      defectId: row.defect_id,
      taskId: row.task_id,
      state: done ? 'done' : open ? 'open' : 'withdrawn',
      answers: done || (row.defect_open && row.defect_holds),
    });
  }
  return [...byOrigin.values()];
}

/** The signatures of a task; a second person's stands while no entry has been made since. */
export function toSignOffs(
  rows: Awaited<ReturnType<typeof listSignOffs>>,
  entries: readonly StepEntryRow[],
): SignOff[] {
  const lastSeq = entries.at(-1)?.seq ?? 0;
  return rows.map((row) => ({
    id: row.id,
    kind: row.kind,
    note: row.note,
    signedAt: row.signed_at.toISOString(),
    signedBy: { id: row.signed_by, name: row.signer_name },
    stands: row.kind === 'test_ride' || row.last_entry_seq >= lastSeq,
  }));
}
