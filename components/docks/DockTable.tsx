import Link from 'next/link';
import { DataTable, type TableColumn } from '@/components/ui/DataTable';
import type { DocksPage } from '@/lib/schemas/fleet';
import { openText, seasonText } from './dock-words';

const COLUMNS: TableColumn[] = [
  { id: 'name', header: 'Dock', sortable: true },
  { id: 'zone', header: 'Time zone', sortable: true },
  { id: 'season', header: 'Season' },
  { id: 'open', header: 'Open' },
  { id: 'units', header: 'Units', align: 'end', sortable: true },
];

/** The docks with their season and how many units each has. */
export function DockTable({ docks }: { docks: DocksPage['docks'] }) {
  return (
    <DataTable
      caption="Docks"
      columns={COLUMNS}
      rows={docks.map((dock) => ({
        key: dock.id,
        cells: {
          name: (
            <Link
              href={`/docks/${dock.id}`}
              className="link inline-flex min-h-target items-center font-bold break-words"
            >
              {dock.name}
            </Link>
          ),
          zone: dock.timeZone.replaceAll('_', ' '),
          season: seasonText(dock.season),
          open: openText(dock.openWeekdays),
          units: (
            <Link
              href={`/units?dock=${dock.id}`}
              className="link numerals inline-flex min-h-target min-w-target items-center sm:justify-end"
            >
              {dock.unitCount}
              <span className="sr-only"> units at {dock.name}</span>
            </Link>
          ),
        },
        sort: { name: dock.name, zone: dock.timeZone, units: dock.unitCount },
      }))}
    />
  );
}
