import { DataTable } from '@/components/ui/DataTable';
import type { PartLevel } from '@/lib/schemas/part';
import { stateOf } from './part-words';
import { StockMark } from './StockMark';

/** What lies of one part at each dock that ever had any. */
export function LevelTable({ levels }: { levels: readonly PartLevel[] }) {
  return (
    <DataTable
      caption="What lies at each dock"
      empty={<p className="text-ink-soft">None was ever on a shelf. Receive some, or count what is there.</p>}
      columns={[
        { id: 'dock', header: 'Dock' },
        { id: 'onHand', header: 'On hand', align: 'end' },
        { id: 'reserved', header: 'Set aside', align: 'end' },
        { id: 'free', header: 'Free', align: 'end' },
        { id: 'lowAt', header: 'Low from', align: 'end' },
      ]}
      rows={levels.map((level) => {
        const state = stateOf(level);
        return {
          key: level.dockId,
          cells: {
            dock: (
              <span className="flex flex-wrap items-center gap-x-3">
                {level.dockName} {state ? <StockMark state={state} /> : null}
              </span>
            ),
            onHand: <span className="numerals text-lg font-bold">{level.onHand}</span>,
            reserved: <span className="numerals">{level.reserved}</span>,
            free: <span className="numerals">{level.free}</span>,
            lowAt: <span className="numerals">{level.lowAt ?? 'Never'}</span>,
          },
        };
      })}
    />
  );
}
