import { NumberInput } from '@/components/ui/NumberInput';
import { computeMinutes, type Labour } from '@/lib/domain/rule';
import { minutesText } from './due-words';
import type { FormState } from './form-state';
import type { AmountName } from './rule-draft';

const FIELDS: { name: AmountName & keyof Labour; label: string }[] = [
  { name: 'baseMinutes', label: 'For each unit' },
  { name: 'perCarbMinutes', label: 'And for each carburettor' },
  { name: 'perEngineMinutes', label: 'And for each engine' },
];

/** How long the work takes, with what that comes to. */
export function LabourFields({ form, labour }: { form: FormState; labour: Labour | null }) {
  const { draft, change, errorOf, readOnly } = form;
  const takes = (carbCount: number) =>
    labour && minutesText(computeMinutes(labour, { carbCount, engines: 1 }));
  return (
    <div className="grid gap-4">
      <div className="grid gap-4 sm:grid-cols-3">
        {FIELDS.map(({ name, label }) => (
          <NumberInput
            key={name}
            label={label}
            id={`labour.${name}`}
            suffix="min"
            whole
            value={draft.amounts[name]}
            readOnly={readOnly}
            error={errorOf(`labour.${name}`)}
            onChange={(event) =>
              change(`labour.${name}`, { amounts: { ...draft.amounts, [name]: event.target.value } })
            }
          />
        ))}
      </div>
      {labour && Object.values(labour).some((minutes) => minutes > 0) ? (
        <p role="status" className="font-semibold">
          One engine without a carburettor takes {takes(0)}, a twin {takes(2)}, a triple {takes(3)}.
        </p>
      ) : null}
    </div>
  );
}
