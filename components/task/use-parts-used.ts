import { useState } from 'react';
import type { Level } from '@/lib/domain/stock';
import type { PartLine } from '@/lib/schemas/part';
import type { TaskParts } from '@/lib/schemas/task-parts';

/** What somebody said of a part used, in place of what the task needs. */
export type Said = { quantity?: number; dockId?: string; reason?: string };

/** One part that a closing takes, with what lies where it is taken from; `level.reserved` is what others have. */
export type UsedLine = {
  partId: string;
  name: string;
  needed: number;
  quantity: number;
  dockId: string;
  dockName: string | undefined;
  reason: string;
  level: Level;
  docks: { id: string; name: string }[];
  path: (field: string) => string;
};

/** What a closing takes out: as the task needs, but where something else was said. `sent` is what the API is sent. */
export function usePartsUsed(task: TaskParts, parts: readonly PartLine[]) {
  const [said, setSaid] = useState<ReadonlyMap<string, Said>>(new Map());
  const wanted = task.parts.filter(({ needed, reserved }) => needed > 0 || reserved > 0);
  const ids = [...new Set([...wanted.map(({ partId }) => partId), ...said.keys()])];
  const lines = ids.flatMap((partId): UsedLine[] => {
    const need = task.parts.find((one) => one.partId === partId);
    const part = parts.find(({ id }) => id === partId);
    const name = need?.name ?? part?.name;
    if (name === undefined) return [];
    const own = said.get(partId) ?? {};
    const dockId = own.dockId ?? task.dockId;
    const here = part?.levels.find((level) => level.dockId === dockId);
    const elsewhere = need?.elsewhere.find((one) => one.dockId === dockId);
    const mine = (dockId === task.dockId ? need?.reserved : elsewhere?.reserved) ?? 0;
    const docks = (part?.levels ?? []).filter((level) => level.onHand > 0 || level.dockId === task.dockId);
    return [
      {
        ...{ partId, name, dockId, reason: own.reason ?? '' },
        needed: need?.needed ?? 0,
        quantity: own.quantity ?? need?.needed ?? 0,
        dockName: here?.dockName,
        level: { onHand: here?.onHand ?? 0, reserved: Math.max(0, (here?.reserved ?? 0) - mine) },
        docks: docks.map((level) => ({ id: level.dockId, name: level.dockName })),
        path: (field) => `partsUsed.${sentIds.indexOf(partId)}.${field}`,
      },
    ];
  });
  const sent = lines
    .filter(({ quantity }) => quantity > 0)
    .map(({ partId, quantity, dockId, reason }) => ({
      ...{ partId, quantity },
      ...(dockId !== task.dockId && { dockId }),
      ...(reason.trim() && { reason }),
    }));
  const sentIds = sent.map(({ partId }) => partId);
  const change = (partId: string, part: Said) =>
    setSaid((before) => new Map(before).set(partId, { ...before.get(partId), ...part }));
  return { lines, sent, change };
}
