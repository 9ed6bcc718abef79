import { listContents, listPartsOf } from '@/db/queries/parts';
import { listLevels } from '@/db/queries/stock';
import type { Context } from '@/lib/context';
import { visibleDocks } from '@/lib/domain/access';
import { computeKits } from '@/lib/domain/stock';
import type { TaskPart, TaskParts } from '@/lib/schemas/task-parts';
import { accessTask } from './access';
import { toLevel } from './shape-part';
import { loadTaskNeeds } from './task-needs';

/**
 * The parts of a task: what it needs and what is set aside for it, what lies at its unit's dock and, of the docks one
 * works at, at others. Throws `not_found`, `forbidden`.
 */
export async function getTaskParts(ctx: Context, taskId: string): Promise<TaskParts> {
  const task = await accessTask(ctx, taskId, 'task.read');
  const { needs } = await loadTaskNeeds(ctx.db, taskId);
  const neededOf = new Map(needs.map(({ partId, quantity }) => [partId, quantity]));
  const contents = await listContents(ctx.db, [...neededOf.keys()]);
  const rows = await listLevels(ctx.db, { dockIds: visibleDocks(ctx.actor), taskId });
  const own = rows.filter((row) => row.own > 0).map((row) => row.part_id);
  const partIds = [...new Set([...neededOf.keys(), ...own])];
  const parts = new Map((await listPartsOf(ctx.db, partIds)).map((part) => [part.id, part]));
  /** Free for this task: what is set aside for it too. */
  const freeFor = (row: (typeof rows)[number]) => toLevel({ ...row, reserved: row.reserved - row.own }).free;
  const at = (partId: string) => rows.filter((row) => row.part_id === partId);
  const hereOf = (partId: string) => at(partId).find((row) => row.dock_id === task.dock_id);
  const toTaskPart = (partId: string): TaskPart => {
    const part = parts.get(partId)!;
    const here = hereOf(partId);
    const needed = neededOf.get(partId) ?? 0;
    const free = here ? freeFor(here) : 0;
    const elsewhere = at(partId)
      .filter((row) => row.dock_id !== task.dock_id && (freeFor(row) > 0 || row.own > 0))
      .map((row) => ({
        dockId: row.dock_id,
        dockName: row.dock_name,
        free: freeFor(row),
        reserved: row.own,
      }));
    return {
      ...{ partId, number: part.number, name: part.name, isKit: part.is_kit, needed },
      ...{ onHand: here?.on_hand ?? 0, reserved: here?.own ?? 0, free },
      short: Math.max(0, needed - free - elsewhere.reduce((sum, { reserved }) => sum + reserved, 0)),
      canMakeUp: computeKits(contents.filter(({ kit_id }) => kit_id === partId).map(toCount), (id) => {
        const shelf = hereOf(id);
        return shelf ? toLevel(shelf).free : 0;
      }),
      elsewhere,
    };
  };
  const list = partIds.map(toTaskPart);
  return { taskId, dockId: task.dock_id, dockName: task.dock_name, parts: list };
}

const toCount = ({ part_id, quantity }: { part_id: string; quantity: number }) => ({
  partId: part_id,
  quantity,
});
