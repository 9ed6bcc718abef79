import { NumberInput } from '@/components/ui/NumberInput';
import type { FormState } from './form-state';
import type { AmountName, TriggerDraft } from './rule-draft';

type Row = { name: AmountName; path: string };
type Column = { on: TriggerDraft['on']; suffix: string; whole: boolean; early: Row; late: Row; lead: Row };

const COLUMNS: Column[] = [
  {
    on: 'engine_hours',
    suffix: 'h',
    whole: false,
    early: { name: 'earlyHours', path: 'window.earlyHours' },
    late: { name: 'lateHours', path: 'window.lateHours' },
    lead: { name: 'leadHours', path: 'lead.hours' },
  },
  {
    on: 'outings',
    suffix: 'outings',
    whole: true,
    early: { name: 'earlyOutings', path: 'window.earlyOutings' },
    late: { name: 'lateOutings', path: 'window.lateOutings' },
    lead: { name: 'leadOutings', path: 'lead.outings' },
  },
  {
    on: 'calendar',
    suffix: 'days',
    whole: true,
    early: { name: 'earlyDays', path: 'window.earlyDays' },
    late: { name: 'lateDays', path: 'window.lateDays' },
    lead: { name: 'leadDays', path: 'lead.days' },
  },
];

const LINES = [
  { part: 'lead', title: 'Show it as upcoming' },
  { part: 'early', title: 'It may be done early by' },
  { part: 'late', title: 'It may be done late by' },
] as const;

/** Lead and window, only in the measures that the rule's triggers count. */
export function WindowFields({ form }: { form: FormState }) {
  const columns = COLUMNS.filter((column) => form.draft.triggers.some(({ on }) => on === column.on));
  return (
    <div className="grid gap-4">
      {LINES.map(({ part, title }) => (
        <fieldset key={part} className="grid min-w-0 gap-2">
          <legend className="float-left mb-1 font-semibold">{title}</legend>
          <div className="flex flex-wrap gap-4">
            {columns.map((column) => {
              const { name, path } = column[part];
              return (
                <div key={path} className="w-44">
                  <NumberInput
                    label={part === 'lead' ? `${nameOf(column)} ahead` : `${nameOf(column)} ${part}`}
                    id={path}
                    suffix={column.suffix}
                    whole={column.whole}
                    value={form.draft.amounts[name]}
                    readOnly={form.readOnly}
                    error={form.errorOf(path)}
                    onChange={(event) =>
                      form.change(path, { amounts: { ...form.draft.amounts, [name]: event.target.value } })
                    }
                  />
                </div>
              );
            })}
          </div>
        </fieldset>
      ))}
    </div>
  );
}

const nameOf = ({ on }: Column) => (on === 'engine_hours' ? 'Hours' : on === 'outings' ? 'Outings' : 'Days');
