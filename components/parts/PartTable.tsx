import Link from 'next/link';
import type { ReactNode } from 'react';
import { DataTable } from '@/components/ui/DataTable';
import { Tag } from '@/components/ui/Tag';
import type { PartLine } from '@/lib/schemas/part';
import { stateOf } from './part-words';
import { StockMark } from './StockMark';

/** The parts with what lies of each at each dock, in the order they come in: low ones first. */
export function PartTable({
  parts,
  docks,
  empty,
}: {
  parts: readonly PartLine[];
  docks: readonly { id: string; name: string }[];
  empty: ReactNode;
}) {
  return (
    <DataTable
      caption="Parts and what lies of them at each dock"
      empty={empty}
      columns={[
        { id: 'name', header: 'Part', sortable: true },
        { id: 'number', header: 'Number', sortable: true },
        ...docks.map(({ id, name }) => ({ id, header: name, align: 'end' as const, sortable: true })),
      ]}
      rows={parts.map((part) => {
        const at = new Map(part.levels.map((level) => [level.dockId, level]));
        const onHand = (dockId: string) => at.get(dockId)?.onHand ?? 0;
        return {
          key: part.id,
          cells: {
            name: (
              <span className="flex flex-wrap items-center gap-x-3">
                <Link
                  href={`/parts/${part.id}`}
                  className="link inline-flex min-h-target items-center font-bold"
                >
                  {part.name}
                </Link>
                {part.isKit ? <Tag>Kit</Tag> : null}
                {part.retiredAt ? <Tag>Retired</Tag> : null}
              </span>
            ),
            number: <span className="numerals">{part.number}</span>,
            ...Object.fromEntries(docks.map(({ id }) => [id, <OnHand key={id} level={at.get(id)} />])),
          },
          sort: {
            name: part.name,
            number: part.number,
            ...Object.fromEntries(docks.map(({ id }) => [id, onHand(id)])),
          },
        };
      })}
    />
  );
}

function OnHand({ level }: { level: PartLine['levels'][number] | undefined }) {
  if (!level) return <span className="numerals text-ink-soft">0</span>;
  const state = stateOf(level);
  return (
    <span className="inline-flex flex-wrap items-baseline justify-end gap-x-3">
      {state ? <StockMark state={state} /> : null}
      {level.reserved > 0 ? <span className="text-ink-soft">{level.reserved} set aside of</span> : null}
      <span className="numerals text-lg font-bold">{level.onHand}</span>
    </span>
  );
}
