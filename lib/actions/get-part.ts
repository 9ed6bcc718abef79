import { listContents, listKitsWith, listRulesWith } from '@/db/queries/parts';
import { listReservedFor } from '@/db/queries/reservations';
import { listLevels } from '@/db/queries/stock';
import type { Context } from '@/lib/context';
import { visibleDocks } from '@/lib/domain/access';
import type { Part } from '@/lib/schemas/part';
import { accessPart } from './access';
import { toPartLine } from './shape-part';

/**
 * A part with what lies of it at the docks one works at, for which work that is reserved, what a kit holds, which
 * kits hold it and which rules ask for it. Throws `not_found`.
 */
export async function getPart(ctx: Context, id: string): Promise<Part> {
  const row = await accessPart(ctx, id, 'part.read');
  const dockIds = visibleDocks(ctx.actor);
  const [levels, contents, kits, rules, reserved] = await Promise.all([
    listLevels(ctx.db, { dockIds, partIds: [id] }),
    listContents(ctx.db, [id]),
    listKitsWith(ctx.db, id),
    listRulesWith(ctx.db, id),
    listReservedFor(ctx.db, id, dockIds),
  ]);
  return {
    ...toPartLine(row, levels),
    contents: contents.map(({ part_id, number, name, quantity }) => ({
      partId: part_id,
      number,
      name,
      quantity,
    })),
    inKits: kits,
    rules: rules.flatMap(({ id: ruleId, name, parts }) =>
      parts
        .filter(({ partId }) => partId === id)
        .map(({ quantity, per }) => ({ id: ruleId, name, quantity, per })),
    ),
    reservedFor: reserved.map((one) => ({
      taskId: one.task_id,
      title: one.title,
      fleetNumber: one.fleet_number,
      dockName: one.dock_name,
      quantity: one.quantity,
    })),
  };
}
