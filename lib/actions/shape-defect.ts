import type { DefectRow } from '@/db/queries/defects';
import type { Defect } from '@/lib/schemas/defect';

/** A defect as the API and the screens show it. */
export function toDefect(row: DefectRow): Defect {
  return {
    id: row.id,
    unitId: row.unit_id,
    fleetNumber: row.fleet_number,
    title: row.title,
    detail: row.detail,
    holdsUnit: row.holds_unit,
    reportedAt: row.reported_at.toISOString(),
    reportedBy: row.reporter_name,
    readingId: row.reading_id,
    clearedAt: row.cleared_at?.toISOString() ?? null,
    clearedBy: row.clearer_name,
    clearNote: row.clear_note,
  };
}
