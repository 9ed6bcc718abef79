import { Button } from '@/components/ui/Button';
import { NumberInput } from '@/components/ui/NumberInput';
import { Select, type SelectOption } from '@/components/ui/Select';

/** One part of a kit as it is typed. */
export type ContentDraft = { key: number; partId: string; quantity: string };

/** What a kit holds: a part and how many of it, row by row. */
export function ContentRows({
  rows,
  options,
  error,
  onChange,
}: {
  rows: ContentDraft[];
  options: SelectOption[];
  error: (path: string) => string | undefined;
  onChange: (rows: ContentDraft[]) => void;
}) {
  const change = (key: number, part: Partial<ContentDraft>) =>
    onChange(rows.map((row) => (row.key === key ? { ...row, ...part } : row)));
  const next = 1 + Math.max(-1, ...rows.map(({ key }) => key));
  return (
    <fieldset className="grid gap-4 border-t-2 border-line pt-4">
      <legend className="float-left text-xl font-bold">What the kit holds</legend>
      {rows.length === 0 ? <p className="text-ink-soft">Nothing yet.</p> : null}
      {rows.map((row, index) => (
        <div key={row.key} className="grid items-end gap-3 sm:grid-cols-[3fr_1fr_auto]">
          <Select
            label="Part"
            id={`contents.${index}.partId`}
            placeholder="Choose a part"
            options={options}
            value={row.partId}
            error={error(`contents.${index}.partId`)}
            onChange={(event) => change(row.key, { partId: event.target.value })}
          />
          <NumberInput
            label="How many"
            id={`contents.${index}.quantity`}
            whole
            value={row.quantity}
            error={error(`contents.${index}.quantity`)}
            onChange={(event) => change(row.key, { quantity: event.target.value })}
          />
          <Button kind="quiet" onClick={() => onChange(rows.filter(({ key }) => key !== row.key))}>
            Remove
          </Button>
        </div>
      ))}
      <div>
        <Button onClick={() => onChange([...rows, { key: next, partId: '', quantity: '1' }])}>
          Add a part to the kit
        </Button>
      </div>
    </fieldset>
  );
}
