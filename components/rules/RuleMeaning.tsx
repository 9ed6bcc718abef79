import { StateMark } from '@/components/state/StateMark';
import { Select } from '@/components/ui/Select';
import { cx } from '@/components/ui/cx';
import { Skeleton } from '@/components/ui/Skeleton';
import { describeRule } from '@/lib/domain/rule-words';
import type { Due, RulePreview, ScheduleShape } from '@/lib/schemas/rule';
import { toSchedule } from '@/lib/schemas/schedule-shape';
import { dueText, hoursText, TRIGGER_WORDS } from './due-words';
import type { Preview } from './use-preview';

export type UnitChoice = { id: string; label: string; engineHours: number; outings: number };

/** What the rule on the form means: in words, and for one unit of the fleet in its next due points. */
export function RuleMeaning({
  schedule,
  holdsUnit,
  units,
  unitId,
  onUnit,
  preview,
}: {
  schedule: ScheduleShape | null;
  holdsUnit: boolean;
  units: UnitChoice[];
  unitId: string | null;
  onUnit: (id: string) => void;
  preview: Preview;
}) {
  const unit = units.find(({ id }) => id === unitId);
  return (
    <section aria-label="What this rule means" className="grid content-start gap-5 rounded-hull bg-shoal p-5">
      <section aria-live="polite" className="grid gap-2">
        <h2 className="text-xl">What this rule means</h2>
        {schedule ? (
          <ul className="grid gap-2">
            {describeRule(toSchedule(schedule), { holdsUnit }).map((sentence) => (
              <li key={sentence}>{sentence}</li>
            ))}
          </ul>
        ) : (
          <p>Say how often, and this says in words what it comes to.</p>
        )}
      </section>
      <section className="grid gap-3">
        <h2 className="text-xl">Next due</h2>
        {units.length === 0 ? (
          <p>No unit of the fleet is covered, so nothing would be due.</p>
        ) : (
          <Select
            label="For the unit"
            id="preview-unit"
            options={units.map(({ id, label }) => ({ value: id, label }))}
            value={unitId ?? ''}
            onChange={(event) => onUnit(event.target.value)}
          />
        )}
        {unit ? (
          <p className="text-ink-soft">
            It stands at {hoursText(unit.engineHours)} and {unit.outings} outings.
          </p>
        ) : null}
        <Answer preview={preview} schedule={schedule} />
      </section>
    </section>
  );
}

function Answer({ preview, schedule }: { preview: Preview; schedule: ScheduleShape | null }) {
  if (preview.status === 'none' || !schedule) return null;
  if (preview.status === 'loading') return <Skeleton lines={3} label="Working out the due points" />;
  if (preview.status === 'failed') return <p className="font-semibold text-danger">{preview.detail}</p>;
  return (
    <div role="status" className="grid gap-4">
      {preview.preview.triggers.map((trigger) => (
        <TriggerPreview key={trigger.index} trigger={trigger} on={schedule.triggers[trigger.index]?.on} />
      ))}
    </div>
  );
}

function TriggerPreview({
  trigger,
  on,
}: {
  trigger: RulePreview['triggers'][number];
  on: keyof typeof TRIGGER_WORDS | undefined;
}) {
  return (
    <div className="grid gap-1">
      {on ? <h3 className="font-semibold text-ink-soft">{TRIGGER_WORDS[on]}</h3> : null}
      {trigger.due ? (
        <>
          <p className="flex flex-wrap items-center gap-x-3 gap-y-1">
            <DueText due={trigger.due} className="text-xl font-bold" />
            <StateMark state={trigger.state} />
          </p>
          {trigger.following.length > 0 ? (
            <ul className="flex flex-wrap gap-x-3" aria-label="Then, each done when due">
              <li aria-hidden="true">then</li>
              {trigger.following.map((due) => (
                <li key={dueText(due)}>
                  <DueText due={due} />
                </li>
              ))}
            </ul>
          ) : null}
        </>
      ) : (
        <p>Used up: it is not due again.</p>
      )}
    </div>
  );
}

function DueText({ due, className }: { due: Due; className?: string }) {
  return (
    <span className={cx('whitespace-nowrap', !('date' in due) && 'numerals', className)}>{dueText(due)}</span>
  );
}
