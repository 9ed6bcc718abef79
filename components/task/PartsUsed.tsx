import { useId, useState } from 'react';
import { partOptions } from '@/components/parts/part-words';
import { Button } from '@/components/ui/Button';
import { namedOptions } from '@/components/ui/options';
import { Select } from '@/components/ui/Select';
import { Stepper } from '@/components/ui/Stepper';
import { TextInput } from '@/components/ui/TextInput';
import { checkTaking } from '@/lib/domain/stock';
import type { PartLine } from '@/lib/schemas/part';
import type { Said, UsedLine, usePartsUsed } from './use-parts-used';

/**
 * What a closing takes out of stock: as many as the task needs until somebody says otherwise. A line that takes more
 * than is there asks why at once; `errorOf` says what was refused of a line.
 */
export function PartsUsed({
  used,
  parts,
  dockName,
  errorOf,
}: {
  used: ReturnType<typeof usePartsUsed>;
  parts: PartLine[];
  dockName: string;
  errorOf: (path: string) => string | undefined;
}) {
  const id = useId();
  const [adding, setAdding] = useState('');
  const others = parts.filter((part) => !used.lines.some((line) => line.partId === part.id));
  if (used.lines.length === 0 && parts.length === 0) return null;
  return (
    <section className="grid gap-3" aria-labelledby={id}>
      <h3 id={id} className="text-lg">
        Parts used
      </h3>
      {used.lines.length === 0 ? <p className="text-ink-soft">None.</p> : null}
      <ul className="grid">
        {used.lines.map((line) => (
          <Line
            key={line.partId}
            line={line}
            dockName={dockName}
            errorOf={(field) => {
              const at = used.sent.findIndex(({ partId }) => partId === line.partId);
              return errorOf(`partsUsed.${at}.${field}`);
            }}
            onChange={(change) => used.change(line.partId, change)}
          />
        ))}
      </ul>
      {others.length > 0 ? (
        <div className="grid items-end gap-2 sm:grid-cols-[1fr_auto]">
          <Select
            label="Another part"
            placeholder="Choose a part"
            options={partOptions(others)}
            value={adding}
            onChange={(event) => setAdding(event.target.value)}
          />
          <Button
            disabled={!adding}
            onClick={() => {
              used.change(adding, { quantity: 1 });
              setAdding('');
            }}
          >
            Add
          </Button>
        </div>
      ) : null}
    </section>
  );
}

function Line({
  line,
  dockName,
  errorOf,
  onChange,
}: {
  line: UsedLine;
  dockName: string;
  errorOf: (field: string) => string | undefined;
  onChange: (change: Said) => void;
}) {
  const short = checkTaking(line.level, line.quantity);
  const refused = errorOf('reason');
  return (
    <li className="grid gap-2 border-t border-hairline py-3">
      <div className="flex flex-wrap items-center justify-between gap-x-4 gap-y-2">
        <div className="min-w-0">
          <p className="font-bold">{line.name}</p>
          <p className="text-ink-soft">
            <span className="numerals">{line.level.onHand}</span> at {line.dockName ?? dockName}
            {line.needed > 0 ? `; the task needs ${line.needed}` : null}
          </p>
        </div>
        <Stepper
          id={line.path('quantity')}
          label={line.name}
          value={line.quantity}
          onChange={(quantity) => onChange({ quantity })}
        />
      </div>
      {line.docks.length > 1 && line.quantity > 0 ? (
        <Select
          label={`Taken from, ${line.name}`}
          options={namedOptions(line.docks)}
          value={line.dockId}
          onChange={(event) => onChange({ dockId: event.target.value })}
        />
      ) : null}
      {short || line.reason || refused ? (
        <TextInput
          id={line.path('reason')}
          label={`Why more than is there, ${line.name}`}
          hint={short ? `${short[0]!.toUpperCase()}${short.slice(1)}.` : undefined}
          maxLength={300}
          value={line.reason}
          error={refused}
          onChange={(event) => onChange({ reason: event.target.value })}
        />
      ) : null}
    </li>
  );
}
