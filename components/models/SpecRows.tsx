import { Button } from '@/components/ui/Button';
import { NumberInput } from '@/components/ui/NumberInput';
import { TextInput } from '@/components/ui/TextInput';
import type { SpecDraft } from './spec-draft';

type Props = {
  rows: SpecDraft[];
  disabled: boolean;
  error: (path: string) => string | undefined;
  onChange: (rows: SpecDraft[]) => void;
};

const EMPTY = {
  name: '',
  min: '',
  target: '',
  max: '',
  unit: '',
  repeats: '',
  maxSpread: '',
  maxDifference: '',
};
const MORE = {
  repeats: { label: 'Runs wanted', hint: undefined },
  maxSpread: { label: 'Runs within', hint: 'As 1, or 5 %.' },
  maxDifference: { label: 'Places within', hint: 'Carburettors or cylinders: as 2, or 10 %.' },
};

/** The limits of the model's measurements: a row each, by name. */
export function SpecRows({ rows, disabled, error, onChange }: Props) {
  const change = (key: number, part: Partial<SpecDraft>) =>
    onChange(rows.map((row) => (row.key === key ? { ...row, ...part } : row)));
  const add = () => onChange([...rows, { ...EMPTY, key: Math.max(-1, ...rows.map(({ key }) => key)) + 1 }]);
  return (
    <div className="grid gap-4">
      {rows.length === 0 ? <p className="text-ink-soft">No spec yet.</p> : null}
      <ul className="grid">
        {rows.map((row) => (
          <li key={row.key}>
            <fieldset
              disabled={disabled}
              className="grid items-start gap-x-4 gap-y-3 border-t border-hairline py-4 sm:grid-cols-[2fr_1fr_1fr_1fr_1fr_auto]"
            >
              <legend className="sr-only">Spec {row.name}</legend>
              <TextInput
                id={`spec.${row.key}.name`}
                label="Measurement"
                maxLength={60}
                value={row.name}
                error={error(`spec.${row.key}.name`)}
                onChange={(event) => change(row.key, { name: event.target.value })}
              />
              {(['min', 'target', 'max'] as const).map((field) => (
                <NumberInput
                  key={field}
                  id={`spec.${row.key}.${field}`}
                  label={{ min: 'Least', target: 'Target', max: 'Most' }[field]}
                  value={row[field]}
                  error={error(`spec.${row.key}.${field}`)}
                  onChange={(event) => change(row.key, { [field]: event.target.value })}
                />
              ))}
              <TextInput
                id={`spec.${row.key}.unit`}
                label="In"
                maxLength={20}
                placeholder="psi, mm, …"
                value={row.unit}
                error={error(`spec.${row.key}.unit`)}
                onChange={(event) => change(row.key, { unit: event.target.value })}
              />
              <div className="grid items-end gap-x-4 gap-y-3 sm:col-span-full sm:row-start-2 sm:grid-cols-3">
                {(['repeats', 'maxSpread', 'maxDifference'] as const).map((field) => (
                  <TextInput
                    key={field}
                    id={`spec.${row.key}.${field}`}
                    label={MORE[field].label}
                    hint={MORE[field].hint}
                    optional
                    inputMode={field === 'repeats' ? 'numeric' : 'text'}
                    value={row[field]}
                    error={error(`spec.${row.key}.${field}`)}
                    onChange={(event) => change(row.key, { [field]: event.target.value })}
                  />
                ))}
              </div>
              {disabled ? null : (
                <div className="sm:col-start-6 sm:row-start-1 sm:mt-7.5">
                  <Button
                    kind="quiet"
                    aria-label={`Remove ${row.name || 'this spec'}`}
                    onClick={() => onChange(rows.filter(({ key }) => key !== row.key))}
                  >
                    Remove
                  </Button>
                </div>
              )}
            </fieldset>
          </li>
        ))}
      </ul>
      {disabled ? null : (
        <div>
          <Button onClick={add}>Add a spec</Button>
        </div>
      )}
    </div>
  );
}
