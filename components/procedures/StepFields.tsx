import { Button } from '@/components/ui/Button';
import { Checkbox } from '@/components/ui/Checkbox';
import { RadioGroup } from '@/components/ui/RadioGroup';
import { Select } from '@/components/ui/Select';
import { Textarea } from '@/components/ui/Textarea';
import { TextInput } from '@/components/ui/TextInput';
import { MEASURED_UNITS, type MeasuredUnit } from '@/lib/domain/measured-value';
import type { Per } from '@/lib/domain/procedure';
import { canDecide, type StepDraft } from './procedure-draft';
import { stepKindWords } from './step-words';
import { WhenFields } from './WhenFields';

const KINDS = (['check', 'measurement', 'note', 'photo', 'caution'] as const).map((value) => ({
  value,
  label: stepKindWords[value],
}));
const PER: { value: Per; label: string }[] = [
  { value: 'unit', label: 'Once for the unit' },
  { value: 'engine', label: 'For each engine' },
  { value: 'cylinder', label: 'For each cylinder' },
  { value: 'carb', label: 'For each carburettor' },
];
const STAGES = [
  { value: 'both', label: 'As found and as left' },
  { value: 'found', label: 'As found' },
  { value: 'left', label: 'As left' },
];
const OPENS = [
  { value: 'nothing', label: 'Nothing' },
  { value: 'defect', label: 'A defect' },
  { value: 'task', label: 'A task' },
];

type Props = {
  step: StepDraft;
  index: number;
  earlier: readonly StepDraft[];
  last: boolean;
  specsId: string;
  error: (path: string) => string | undefined;
  onChange: (part: Partial<StepDraft>) => void;
  onMove: (by: 1 | -1) => void;
  onRemove: () => void;
};

/** One step of a procedure, with its place among the others. */
export function StepFields({
  step,
  index,
  earlier,
  last,
  specsId,
  error,
  onChange,
  onMove,
  onRemove,
}: Props) {
  const at = (field: string) => `steps.${index}.${field}`;
  const name = step.title || `step ${index + 1}`;
  return (
    <fieldset className="grid gap-4 border-t-2 border-line pt-4">
      <legend className="float-left mb-3 text-xl font-bold">
        <span className="numerals">{index + 1}</span> {step.title}
      </legend>
      <div className="flex flex-wrap gap-2">
        <Button aria-label={`Move ${name} up`} disabled={index === 0} onClick={() => onMove(-1)}>
          Up
        </Button>
        <Button aria-label={`Move ${name} down`} disabled={last} onClick={() => onMove(1)}>
          Down
        </Button>
        <Button kind="quiet" aria-label={`Remove ${name}`} onClick={onRemove}>
          Remove
        </Button>
      </div>
      <RadioGroup
        name={`kind-${step.row}`}
        label="Kind of step"
        look="segmented"
        options={KINDS}
        value={step.kind}
        error={error(at('kind'))}
        onChange={(event) => onChange({ kind: event.target.value as StepDraft['kind'] })}
      />
      <TextInput
        id={at('title')}
        label={step.kind === 'caution' ? 'Caution' : 'What is done'}
        maxLength={160}
        value={step.title}
        error={error(at('title')) ?? error(at('key'))}
        onChange={(event) => onChange({ title: event.target.value })}
      />
      <Textarea
        id={at('detail')}
        label="How"
        optional
        rows={2}
        value={step.detail}
        error={error(at('detail'))}
        onChange={(event) => onChange({ detail: event.target.value })}
      />
      {step.kind === 'caution' ? null : (
        <>
          {step.kind === 'measurement' ? (
            <MeasureFields step={step} at={at} specsId={specsId} error={error} onChange={onChange} />
          ) : null}
          <Select
            id={at('per')}
            label="How often"
            options={PER}
            value={step.per}
            error={error(at('per'))}
            onChange={(event) => onChange({ per: event.target.value as Per })}
          />
          <Checkbox
            id={at('required')}
            label="The work cannot be closed without it"
            checked={step.required}
            onChange={(event) => onChange({ required: event.target.checked })}
          />
          <TextInput
            id={at('caution')}
            label="Caution at this step"
            optional
            maxLength={1000}
            value={step.caution}
            error={error(at('caution'))}
            onChange={(event) => onChange({ caution: event.target.value })}
          />
          <WhenFields
            step={step}
            at={at}
            earlier={earlier.filter(canDecide)}
            error={error}
            onChange={onChange}
          />
        </>
      )}
      {canDecide(step) ? (
        <RetestField step={step} at={at} earlier={earlier} error={error} onChange={onChange} />
      ) : null}
      {canDecide(step) ? <FailFields step={step} at={at} error={error} onChange={onChange} /> : null}
    </fieldset>
  );
}

type Part = Pick<Props, 'step' | 'error' | 'onChange'> & { at: (field: string) => string };

function MeasureFields({ step, at, specsId, error, onChange }: Part & { specsId: string }) {
  return (
    <div className="grid items-end gap-4 sm:grid-cols-3">
      <TextInput
        id={at('measures.spec')}
        label="Judged by the spec"
        hint="By its name on the model."
        list={specsId}
        maxLength={60}
        value={step.spec}
        error={error(at('measures.spec')) ?? error(at('measures'))}
        onChange={(event) => onChange({ spec: event.target.value })}
      />
      <Select
        id={at('measures.unit')}
        label="Taken in"
        options={MEASURED_UNITS.map((value) => ({ value, label: value || 'no unit' }))}
        value={step.unit}
        error={error(at('measures.unit'))}
        onChange={(event) => onChange({ unit: event.target.value as MeasuredUnit })}
      />
      <Select
        id={at('measures.stages')}
        label="When"
        options={STAGES}
        value={step.stages}
        error={error(at('measures.stages'))}
        onChange={(event) => onChange({ stages: event.target.value as StepDraft['stages'] })}
      />
    </div>
  );
}

function RetestField({ step, at, earlier, error, onChange }: Part & Pick<Props, 'earlier'>) {
  const alike = earlier.filter((other) => canDecide(other) && other.per === step.per);
  if (alike.length === 0 && step.retests === null) return null;
  return (
    <Select
      id={at('retests')}
      label="Tests again, after the work"
      optional
      placeholder="No earlier step"
      options={alike.map((other) => ({
        value: String(other.row),
        label: other.title || 'Without a name',
      }))}
      value={step.retests === null ? '' : String(step.retests)}
      error={error(at('retests'))}
      onChange={(event) =>
        onChange({ retests: event.target.value === '' ? null : Number(event.target.value) })
      }
    />
  );
}

function FailFields({ step, at, error, onChange }: Part) {
  return (
    <div className="grid items-start gap-4 sm:grid-cols-2">
      <Select
        id={at('onFail')}
        label="If it fails, open"
        options={OPENS}
        value={step.opens}
        error={error(at('onFail'))}
        onChange={(event) => onChange({ opens: event.target.value as StepDraft['opens'] })}
      />
      {step.opens === 'nothing' ? null : (
        <>
          <TextInput
            id={at('onFail.title')}
            label="Called"
            maxLength={120}
            value={step.failTitle}
            error={error(at('onFail.title'))}
            onChange={(event) => onChange({ failTitle: event.target.value })}
          />
          <Checkbox
            id={at('onFail.holdsUnit')}
            label="It holds the unit"
            checked={step.failHolds}
            onChange={(event) => onChange({ failHolds: event.target.checked })}
          />
        </>
      )}
    </div>
  );
}
