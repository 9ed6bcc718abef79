import type { StoredClosed, StoredDuty, StoredHeldTime } from '@/db/queries/digest-facts';
import type { ReadinessRow, StoredHold } from '@/db/queries/readiness';
import type { CalendarDay } from '@/lib/domain/calendar-day';
import type { DockFacts } from '@/lib/domain/digest';
import { toDuePoint } from '@/lib/domain/duty-standing';

type Stored = {
  duties: readonly StoredDuty[];
  readiness: readonly ReadinessRow[];
  heldTimes: readonly StoredHeldTime[];
  closed: readonly StoredClosed[];
};

/** What was stored, as the domain computes the digest of one dock with it. */
export function toDigestFacts(
  dockId: string,
  today: CalendarDay,
  stored: Stored,
): Pick<DockFacts, 'duties' | 'held' | 'heldTimes' | 'closed'> {
  const here = <T extends { dock_id: string }>(rows: readonly T[]) =>
    rows.filter((row) => row.dock_id === dockId);
  return {
    duties: here(stored.duties).map((row) => ({
      ...ofUnit(row),
      ruleId: row.rule_id,
      ruleName: row.rule_name,
      holdsUnit: row.holds_unit,
      points: row.points.map(toDuePoint),
      standing: { engineHoursTenths: row.engine_hours_tenths, outings: row.outing_count, today },
      ranTenths: row.ran_tenths,
      ranOutings: row.ran_outings,
    })),
    held: here(stored.readiness).flatMap((row) => {
      const holds = row.holds ?? [];
      if (holds.length === 0) return [];
      const since = new Date(Math.min(...holds.map((hold) => Date.parse(hold.since))));
      const reasons = [...new Set(holds.map(nameHold))];
      return [{ unitId: row.id, fleetNumber: row.fleet_number, reasons, since }];
    }),
    heldTimes: here(stored.heldTimes).map((row) => ({
      ...ofUnit(row),
      from: row.from_at,
      until: row.until_at,
      inServiceFrom: row.entered_service_on,
    })),
    closed: here(stored.closed).map((row) => ({
      ...ofUnit(row),
      taskId: row.task_id,
      title: row.title,
      closedOn: row.closed_on,
      engineHoursTenths: row.engine_hours_tenths,
      closedBy: row.closed_by,
    })),
  };
}

const ofUnit = (row: { unit_id: string; fleet_number: string }) => ({
  unitId: row.unit_id,
  fleetNumber: row.fleet_number,
});

function nameHold(hold: StoredHold): string {
  switch (hold.reason) {
    case 'overdue':
      return `overdue: ${hold.rule_name}`;
    case 'defect':
      return `defect: ${hold.defect_title}`;
    case 'laid_up':
      return `laid up: ${hold.lay_up_reason}`;
    case 'not_assessed':
      return 'not yet assessed';
  }
}
