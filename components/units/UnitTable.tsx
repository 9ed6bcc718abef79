import Link from 'next/link';
import { hoursText } from '@/components/rules/due-words';
import { StateMark } from '@/components/state/StateMark';
import { DataTable, type TableColumn } from '@/components/ui/DataTable';
import { Tag } from '@/components/ui/Tag';
import type { FleetUnit } from '@/lib/schemas/fleet';
import { roomLines } from './unit-words';

const COLUMNS: TableColumn[] = [
  { id: 'unit', header: 'Unit', sortable: true },
  { id: 'state', header: 'State', sortable: true },
  { id: 'left', header: 'Before its next hold', sortable: true },
  { id: 'hours', header: 'Engine hours', align: 'end', sortable: true },
  { id: 'model', header: 'Model', sortable: true },
  { id: 'dock', header: 'Dock', sortable: true },
];

/** What of a unit's room comes soonest, in days: hours at the water line's five in three days, outings alike. */
function soonest({ hoursToHold, outingsToHold, daysToHold }: FleetUnit): number | null {
  const days = [
    hoursToHold === null ? [] : [(hoursToHold * 3) / 5],
    outingsToHold === null ? [] : [(outingsToHold * 3) / 5],
    daysToHold === null ? [] : [daysToHold],
  ].flat();
  return days.length > 0 ? Math.min(...days) : null;
}

/** The units one by one, in the order given: natural by fleet number. */
export function UnitTable({ units }: { units: FleetUnit[] }) {
  return (
    <DataTable
      caption="Units"
      columns={COLUMNS}
      rows={units.map((unit) => ({
        key: unit.id,
        cells: {
          unit: (
            <Link
              href={`/units/${unit.id}`}
              className="link numerals inline-flex min-h-target items-center text-lg font-bold"
            >
              {unit.fleetNumber}
            </Link>
          ),
          state: <State unit={unit} />,
          left: <Left unit={unit} />,
          hours: <span className="numerals whitespace-nowrap">{hoursText(unit.engineHours)}</span>,
          model: unit.modelName,
          dock: unit.dockName,
        },
        sort: {
          unit: unit.fleetNumber,
          state: unit.state,
          left: soonest(unit),
          hours: unit.engineHours,
          model: unit.modelName,
          dock: unit.dockName,
        },
      }))}
    />
  );
}

function State({ unit }: { unit: FleetUnit }) {
  if (unit.state === null) return <Tag>Retired</Tag>;
  return (
    <div className="grid gap-1">
      <StateMark state={unit.state} plain />
      {unit.holds.map((hold, index) => (
        <p key={index} className="max-w-prose text-sm">
          {hold.text}
        </p>
      ))}
    </div>
  );
}

function Left({ unit }: { unit: FleetUnit }) {
  const lines = roomLines(unit);
  if (lines.length === 0) return <span className="text-ink-soft">No hold ahead</span>;
  return (
    <div>
      <ul className="numerals">
        {lines.map((line) => (
          <li key={line} className="whitespace-nowrap">
            {line}
          </li>
        ))}
      </ul>
      {unit.holdingRuleName ? <p className="text-sm text-ink-soft">First: {unit.holdingRuleName}</p> : null}
    </div>
  );
}
