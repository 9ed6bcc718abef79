import { Button } from '@/components/ui/Button';
import { NumberInput } from '@/components/ui/NumberInput';
import { RadioGroup } from '@/components/ui/RadioGroup';
import { Select } from '@/components/ui/Select';
import type { FormState } from './form-state';
import { CalendarFields } from './CalendarFields';
import { TRIGGER_WORDS } from './due-words';
import type { TriggerDraft } from './rule-draft';

const KINDS = (['engine_hours', 'outings', 'calendar'] as const).map((value) => ({
  value,
  label: TRIGGER_WORDS[value],
}));

/** One "how often" of the rule. */
export function TriggerEditor({
  form,
  trigger,
  index,
  onRemove,
}: {
  form: FormState;
  trigger: TriggerDraft;
  index: number;
  onRemove?: () => void;
}) {
  const path = `triggers.${index}`;
  const put = (field: string, part: Partial<TriggerDraft>) =>
    form.changeTrigger(`${path}.${field}`, index, part);
  return (
    <fieldset className="grid min-w-0 gap-4 rounded border-2 border-hairline p-3 sm:p-4">
      <legend className="px-2 font-bold">{index === 0 ? 'Every' : 'Or every'}</legend>
      <Select
        label="Counted by"
        id={`${path}.on`}
        options={KINDS}
        value={trigger.on}
        disabled={form.readOnly}
        onChange={(event) => put('on', { on: event.target.value as TriggerDraft['on'] })}
      />
      {trigger.on === 'calendar' ? (
        <CalendarFields form={form} trigger={trigger} path={path} put={put} />
      ) : (
        <MeterFields form={form} trigger={trigger} path={path} put={put} />
      )}
      <RadioGroup
        label="The next one is counted from"
        name={`${path}.anchor`}
        id={`${path}.anchor`}
        options={ANCHORS}
        value={trigger.anchor}
        disabled={form.readOnly}
        onChange={(event) => put('anchor', { anchor: event.target.value as TriggerDraft['anchor'] })}
      />
      {onRemove && !form.readOnly ? (
        <div>
          <Button kind="quiet" onClick={onRemove}>
            Remove this trigger
          </Button>
        </div>
      ) : null}
    </fieldset>
  );
}

const ANCHORS = [
  { value: 'scheduled', label: 'when it was due', hint: 'A little early or late is not passed on.' },
  { value: 'completed', label: 'when it was done', hint: 'The full interval runs from the work.' },
];

type FieldsProps = {
  form: FormState;
  trigger: TriggerDraft;
  path: string;
  put: (field: string, part: Partial<TriggerDraft>) => void;
};

function MeterFields({ form, trigger, path, put }: FieldsProps) {
  const whole = trigger.on === 'outings';
  const suffix = whole ? 'outings' : 'h';
  return (
    <div className="grid gap-4 sm:grid-cols-2">
      <NumberInput
        label="Every"
        id={`${path}.every`}
        suffix={suffix}
        whole={whole}
        value={trigger.every}
        readOnly={form.readOnly}
        error={form.errorOf(`${path}.every`)}
        onChange={(event) => put('every', { every: event.target.value })}
      />
      <NumberInput
        label="First at"
        optional
        id={`${path}.first`}
        suffix={suffix}
        whole={whole}
        value={trigger.first}
        readOnly={form.readOnly}
        error={form.errorOf(`${path}.first`)}
        onChange={(event) => put('first', { first: event.target.value })}
      />
    </div>
  );
}
