import { Button } from '@/components/ui/Button';
import { Select } from '@/components/ui/Select';
import type { StepDraft } from './procedure-draft';

const OUTCOMES = [
  { value: 'fail', label: 'failed' },
  { value: 'pass', label: 'passed' },
];
const MOST = 5;

/** The earlier steps that decide whether this one is done at all; any of them is enough. */
export function WhenFields({
  step,
  at,
  earlier,
  error,
  onChange,
}: {
  step: StepDraft;
  at: (field: string) => string;
  /** Those before it that can pass or fail. */
  earlier: readonly StepDraft[];
  error: (path: string) => string | undefined;
  onChange: (part: Partial<StepDraft>) => void;
}) {
  const change = (index: number, part: Partial<StepDraft['when'][number]>) =>
    onChange({ when: step.when.map((one, other) => (other === index ? { ...one, ...part } : one)) });
  if (earlier.length === 0 && step.when.length === 0) return null;
  return (
    <div className="grid gap-3">
      {step.when.map(({ row, outcome }, index) => (
        <div key={index} className="grid items-end gap-3 sm:grid-cols-[2fr_1fr_auto]">
          <Select
            id={index === 0 ? at('when') : `${at('when')}.${index}`}
            label={index === 0 ? 'Only where' : 'Or where'}
            placeholder={earlier.some((other) => other.row === row) ? undefined : 'Choose an earlier step'}
            options={earlier.map((other) => ({
              value: String(other.row),
              label: other.title || 'Without a name',
            }))}
            value={earlier.some((other) => other.row === row) ? String(row) : ''}
            error={index === 0 ? error(at('when')) : undefined}
            onChange={(event) => change(index, { row: Number(event.target.value) })}
          />
          <Select
            id={`${at('when')}.${index}.outcome`}
            label="Came out as"
            options={OUTCOMES}
            value={outcome}
            onChange={(event) => change(index, { outcome: event.target.value as 'pass' | 'fail' })}
          />
          <Button
            kind="quiet"
            aria-label={`Remove condition ${index + 1} of ${step.title || 'this step'}`}
            onClick={() => onChange({ when: step.when.filter((_, other) => other !== index) })}
          >
            Remove
          </Button>
        </div>
      ))}
      {step.when.length < MOST && earlier.length > 0 ? (
        <div>
          <Button
            aria-label={`Do ${step.title || 'this step'} only where an earlier step came out so`}
            onClick={() => onChange({ when: [...step.when, { row: earlier.at(-1)!.row, outcome: 'fail' }] })}
          >
            {step.when.length === 0 ? 'Only where an earlier step …' : 'Or where another step …'}
          </Button>
        </div>
      ) : null}
    </div>
  );
}
