import { listLayUps } from '@/db/queries/lay-ups';
import { listReadiness } from '@/db/queries/readiness';
import type { Context } from '@/lib/context';
import { canAtDock } from '@/lib/domain/access';
import { localDay } from '@/lib/domain/calendar-day';
import { readCursor } from '@/lib/schemas/cursor';
import type { UnitPage } from '@/lib/schemas/fleet';
import { historyPlace, type HistoryKind } from '@/lib/schemas/history';
import { toHours } from '@/lib/schemas/schedule-shape';
import { accessUnit } from './access';
import { listDuePoints } from './list-due-points';
import { listHistory } from './list-history';
import { toFleetUnit } from './shape-fleet-unit';
import { toLayUp } from './shape-lay-up';

type Asked = { kind?: HistoryKind | undefined; cursor?: string | undefined };

/**
 * What a unit's page is drawn from: how it stands and why, its duties, a page of its history, and what the actor may
 * do to it. A cursor that no list answered shows the latest. Throws `not_found` or `forbidden`.
 */
export async function openUnit(ctx: Context, id: string, { kind, cursor }: Asked): Promise<UnitPage> {
  const unit = await accessUnit(ctx, id, 'unit.read');
  const after = cursor && readCursor(historyPlace, cursor) ? cursor : undefined;
  const [[readiness], [layUp], duties, history] = await Promise.all([
    listReadiness(ctx.db, { unitId: unit.id }, ctx.now),
    listLayUps(ctx.db, 'all', { unitId: unit.id, open: true }),
    listDuePoints(ctx, unit.id),
    listHistory(ctx, unit.id, { ...(kind && { kind }), ...(after && { cursor: after }) }),
  ]);
  const retired = unit.retired_at !== null;
  const may = (act: Parameters<typeof canAtDock>[1]) => !retired && canAtDock(ctx.actor, act, unit.dock_id);
  return {
    unit: toFleetUnit(unit, readiness, ctx.now),
    now: ctx.now.toISOString(),
    today: localDay(ctx.now, unit.time_zone),
    timeZone: unit.time_zone,
    shownHours: toHours(unit.shown_tenths),
    out: readiness?.outing_id
      ? {
          startedAt: readiness.started_at?.toISOString() ?? null,
          dueBackAt: readiness.due_back_at?.toISOString() ?? null,
        }
      : null,
    layUp: layUp ? toLayUp(layUp) : null,
    duties,
    history: { ...history, kind: kind ?? null, paged: after !== undefined },
    may: {
      change: may('unit.write'),
      layUp: may('lay-up.write'),
      reportDefect: may('defect.write'),
      openTask: may('task.write'),
      voidReading: may('reading.void'),
      recordBaseline: may('baseline.write'),
    },
  };
}
