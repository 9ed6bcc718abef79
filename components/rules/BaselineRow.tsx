import { StateMark } from '@/components/state/StateMark';
import { Button } from '@/components/ui/Button';
import { NumberInput } from '@/components/ui/NumberInput';
import { TextInput } from '@/components/ui/TextInput';
import { describeDay } from '@/lib/domain/words';
import type { UnitDuty } from '@/lib/schemas/due-point';
import { hoursText } from './due-words';
import type { BaselineDraft } from './use-baselines';

/** One rule of the unit: when its work was last done as far as is known, and the fields to say so. */
export function BaselineRow({
  duty,
  today,
  draft,
  errors,
  busy,
  onChange,
  onSave,
}: {
  duty: UnitDuty;
  today: string;
  draft: BaselineDraft;
  errors: Record<string, string>;
  busy: boolean;
  onChange: (part: Partial<BaselineDraft>) => void;
  onSave: () => void;
}) {
  const { ruleId, lastDone } = duty;
  const other = errors['ruleId'] ?? errors[''];
  return (
    <li className="grid gap-x-6 gap-y-3 border-t border-hairline py-4 lg:grid-cols-[14rem_minmax(0,1fr)]">
      <div>
        <h2 className="text-lg">{duty.ruleName}</h2>
        <StateMark state={duty.state} plain />
        <p className="text-ink-soft">
          {lastDone
            ? `Last done ${describeDay(lastDone.on)} at ${hoursText(lastDone.engineHours)}, ${lastDone.outings} outings`
            : 'No record that it was ever done'}
        </p>
      </div>
      <fieldset className="grid min-w-0 gap-3">
        <legend className="sr-only">{duty.ruleName}: last done</legend>
        <div className="flex flex-wrap items-start gap-4">
          <div className="w-48">
            <TextInput
              label="Last done on"
              type="date"
              max={today}
              id={`${ruleId}.closedOn`}
              value={draft.closedOn}
              error={errors['closedOn']}
              onChange={(event) => onChange({ closedOn: event.target.value })}
            />
          </div>
          <div className="w-40">
            <NumberInput
              label="At"
              suffix="h"
              id={`${ruleId}.engineHours`}
              value={draft.engineHours}
              error={errors['engineHours']}
              onChange={(event) => onChange({ engineHours: event.target.value })}
            />
          </div>
          <div className="w-48">
            <NumberInput
              label="Outings by then"
              optional
              whole
              id={`${ruleId}.outings`}
              value={draft.outings}
              error={errors['outings']}
              onChange={(event) => onChange({ outings: event.target.value })}
            />
          </div>
          <div className="w-full sm:mt-8 sm:w-auto">
            <Button busy={busy} onClick={onSave} aria-label={`Save ${duty.ruleName}`}>
              Save
            </Button>
          </div>
        </div>
        {other ? (
          <p role="alert" className="font-semibold text-danger">
            {other}
          </p>
        ) : null}
      </fieldset>
    </li>
  );
}
