import type { DockRow } from '@/db/queries/docks';
import type { Dock } from '@/lib/schemas/dock';

/** A dock as the API and the screens show it. */
export function toDock(row: DockRow): Dock {
  return {
    id: row.id,
    name: row.name,
    timeZone: row.time_zone,
    season: row.season_from && row.season_to ? { from: row.season_from, to: row.season_to } : null,
    openWeekdays: row.open_weekdays as Dock['openWeekdays'],
    craftNumbers: row.craft_numbers,
  };
}

/** What the unique index of `dock` says. */
export const DOCK_NAME: Record<string, [path: string, message: string]> = {
  dock_name: ['name', 'A dock has that name already.'],
};
