'use client';

import { ChooseFiles } from '@/components/files/ChooseFiles';
import { FileTiles } from '@/components/files/FileTiles';
import { keepFile, useWaitingFiles } from '@/components/files/use-files';
import type { Step } from '@/lib/domain/procedure';
import type { PlaceState } from '@/lib/domain/step-states';
import { EntryTrail } from './EntryTrail';
import { useSharedWork } from './WorkProvider';

/** Pictures of a step. Each is kept on the device first and sent before the entry that names it. */
export function PhotoEntry({ step, place }: { step: Step; place: PlaceState }) {
  const { work, me, enter, kept, mayWork, ready } = useSharedWork();
  const spot = { step, place: place.place, stage: null };
  const ids = place.entry?.kind === 'photo' ? place.entry.attachmentIds : [];
  const waiting = useWaitingFiles(kept).filter(({ id }) => ids.includes(id));
  const files = ids
    .filter((id) => !waiting.some((one) => one.id === id))
    .map((id, index) => ({ id, name: `${step.title}, ${index + 1}`, kind: 'picture' as const }));
  async function add(chosen: readonly File[]): Promise<void> {
    const of = { unitId: work.unitId, taskId: work.taskId };
    const added: string[] = [];
    for (const file of chosen)
      added.push(await keepFile(file, of, { scope: `task:${work.taskId}`, owner: me.id }));
    await enter(spot, { kind: 'photo', attachmentIds: [...ids, ...added].slice(0, 20) });
  }
  function remove(id: string): void {
    const left = ids.filter((one) => one !== id);
    void enter(spot, left.length === 0 ? { kind: 'cleared' } : { kind: 'photo', attachmentIds: left });
  }
  return (
    <div className="grid gap-2">
      <FileTiles files={files} waiting={waiting} onRemove={mayWork ? ({ id }) => remove(id) : undefined} />
      {mayWork ? <ChooseFiles disabled={!ready} onChoose={(chosen) => void add(chosen)} /> : null}
      <EntryTrail spot={spot} />
    </div>
  );
}
