import type { ListedReading } from '@/db/queries/reading-list';
import type { Reading } from '@/lib/schemas/reading';
import { toHours } from '@/lib/schemas/schedule-shape';

/** A reading as the API and the screens show it, in decimal hours. */
export function toReading(row: ListedReading): Reading {
  return {
    id: row.id,
    unitId: row.unit_id,
    fleetNumber: row.fleet_number,
    dockId: row.dock_id,
    dockName: row.dock_name,
    timeZone: row.time_zone,
    at: row.taken_at.toISOString(),
    source: row.source,
    engineHours: toHours(row.engine_hours_tenths),
    shownHours: toHours(row.shown_tenths),
    previous:
      row.previous_at && row.previous_tenths !== null
        ? { at: row.previous_at.toISOString(), engineHours: toHours(row.previous_tenths) }
        : null,
    outingId: row.outing_id,
    outingStartedAt: row.outing_started_at?.toISOString() ?? null,
    recordedAt: row.recorded_at.toISOString(),
    recordedBy: row.recorder_name,
    confirmReason: row.confirm_reason,
    review: row.review_code,
    reviewedAt: row.reviewed_at?.toISOString() ?? null,
    reviewNote: row.review_note,
    voidedAt: row.voided_at?.toISOString() ?? null,
    voidReason: row.void_reason,
    replacesReadingId: row.replaces_reading_id,
  };
}
