import { NumberInput } from '@/components/ui/NumberInput';
import { TRIGGER_WORDS } from './due-words';
import type { FormState } from './form-state';
import type { AmountName, TriggerDraft } from './rule-draft';

type Field = { label: string; name: AmountName; path: string };
type Measure = { on: TriggerDraft['on']; suffix: string; whole: boolean; fields: Field[] };

const measure = (on: Measure['on'], suffix: string, noun: 'Hours' | 'Outings' | 'Days'): Measure => ({
  on,
  suffix,
  whole: noun !== 'Hours',
  fields: [
    { label: 'Upcoming from', name: `lead${noun}`, path: `lead.${noun.toLowerCase()}` },
    { label: 'May be early by', name: `early${noun}`, path: `window.early${noun}` },
    { label: 'May be late by', name: `late${noun}`, path: `window.late${noun}` },
  ],
});
const MEASURES = [
  measure('engine_hours', 'h', 'Hours'),
  measure('outings', 'outings', 'Outings'),
  measure('calendar', 'days', 'Days'),
];

/** Lead and window, only in the measures that the rule's triggers count. */
export function WindowFields({ form }: { form: FormState }) {
  const { draft, change, errorOf, readOnly } = form;
  return MEASURES.filter(({ on }) => draft.triggers.some((trigger) => trigger.on === on)).map(
    ({ on, suffix, whole, fields }) => (
      <fieldset key={on} className="grid min-w-0 gap-2">
        <legend className="float-left mb-1 text-ink-soft">{TRIGGER_WORDS[on]}</legend>
        <div className="grid gap-4 sm:grid-cols-3">
          {fields.map(({ label, name, path }) => (
            <NumberInput
              key={path}
              label={label}
              id={path}
              suffix={suffix}
              whole={whole}
              value={draft.amounts[name]}
              readOnly={readOnly}
              error={errorOf(path)}
              onChange={(event) =>
                change(path, { amounts: { ...draft.amounts, [name]: event.target.value } })
              }
            />
          ))}
        </div>
      </fieldset>
    ),
  );
}
