import Link from 'next/link';
import { DataTable } from '@/components/ui/DataTable';
import { Timestamp } from '@/components/ui/Timestamp';
import type { StockMove } from '@/lib/schemas/stock';
import { MOVE_WORDS, signed } from './part-words';

/** Every move of a part, the latest first: who, when, why, and what was on hand after it. */
export function Ledger({ moves, now }: { moves: readonly StockMove[]; now: string }) {
  return (
    <DataTable
      caption="Moves, the latest first"
      empty={<p className="text-ink-soft">Nothing was moved yet.</p>}
      columns={[
        { id: 'when', header: 'When' },
        { id: 'what', header: 'What' },
        { id: 'dock', header: 'Dock' },
        { id: 'quantity', header: 'By', align: 'end' },
        { id: 'balance', header: 'On hand after', align: 'end' },
        { id: 'who', header: 'Who' },
        { id: 'why', header: 'Why' },
      ]}
      rows={moves.map((move) => ({
        key: move.id,
        cells: {
          when: <Timestamp at={move.movedAt} now={now} timeZone={move.timeZone} />,
          what: <strong>{MOVE_WORDS[move.kind]}</strong>,
          dock: move.dockName,
          quantity: <span className="numerals font-bold">{signed(move.quantity)}</span>,
          balance: <span className="numerals">{move.balance}</span>,
          who: move.movedBy?.name ?? 'The system',
          why: <Why move={move} />,
        },
      }))}
    />
  );
}

function Why({ move: { task, reason } }: { move: StockMove }) {
  if (!task) return <>{reason ?? '–'}</>;
  return (
    <>
      <Link href={`/tasks/${task.id}`} className="link">
        {task.title} on <span className="numerals">{task.fleetNumber}</span>
      </Link>
      {reason ? `: ${reason}` : null}
    </>
  );
}
