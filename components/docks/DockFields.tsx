import { Section } from '@/components/rules/Section';
import { Checkbox } from '@/components/ui/Checkbox';
import { RadioGroup } from '@/components/ui/RadioGroup';
import { TextInput } from '@/components/ui/TextInput';
import type { Dock } from '@/lib/schemas/dock';
import { WEEKDAY_OPTIONS } from './dock-words';

type Props = {
  dock: Dock | null;
  timeZones: string[];
  allYear: boolean;
  onAllYear: (allYear: boolean) => void;
  disabled: boolean;
  error: (path: string) => string | undefined;
};

/** What is said of a dock: where its days begin, when it is open, and which numbers its craft bear. */
export function DockFields({ dock, timeZones, allYear, onAllYear, disabled, error }: Props) {
  return (
    <>
      <Section title="Where it is">
        <div className="grid gap-5 sm:grid-cols-2 sm:items-end">
          <TextInput
            name="name"
            label="Name"
            maxLength={80}
            autoComplete="off"
            defaultValue={dock?.name}
            disabled={disabled}
            error={error('name')}
          />
          <div>
            <TextInput
              name="timeZone"
              label="Time zone"
              hint="Type a city and choose. The dock’s days begin and end by it."
              list="time-zones"
              autoComplete="off"
              spellCheck={false}
              defaultValue={dock?.timeZone}
              disabled={disabled}
              error={error('timeZone')}
            />
            <datalist id="time-zones">
              {timeZones.map((zone) => (
                <option key={zone} value={zone} />
              ))}
            </datalist>
          </div>
        </div>
      </Section>
      <Section title="When it is open">
        <Checkbox
          label="All year"
          checked={allYear}
          disabled={disabled}
          onChange={(event) => onAllYear(event.target.checked)}
        />
        {allYear ? null : (
          <div className="grid gap-5 sm:grid-cols-2">
            <TextInput
              name="season.from"
              label="First day of the season"
              hint="Month and day, as 05-15."
              defaultValue={dock?.season?.from}
              disabled={disabled}
              error={error('season.from')}
            />
            <TextInput
              name="season.to"
              label="Last day of the season"
              hint="Month and day, as 09-30. It may lie in the next year."
              defaultValue={dock?.season?.to}
              disabled={disabled}
              error={error('season.to')}
            />
          </div>
        )}
        <Weekdays dock={dock} disabled={disabled} error={error('openWeekdays')} />
      </Section>
      <Section title="Numbers on craft">
        <RadioGroup
          name="craftNumbers"
          id="craftNumbers"
          label="Hull numbers and registrations follow"
          defaultValue={dock?.craftNumbers ?? 'us'}
          disabled={disabled}
          error={error('craftNumbers')}
          options={[
            { value: 'us', label: 'US federal formats', hint: 'Checked when a unit is saved.' },
            { value: 'other', label: 'Another country', hint: 'Taken as they are written.' },
          ]}
        />
      </Section>
    </>
  );
}

function Weekdays({
  dock,
  disabled,
  error,
}: {
  dock: Dock | null;
  disabled: boolean;
  error: string | undefined;
}) {
  return (
    <fieldset id="openWeekdays" className="grid gap-1" aria-invalid={error ? true : undefined}>
      <legend className="float-left mb-1.5 font-semibold">Open on</legend>
      <div className="grid gap-x-6 sm:grid-cols-2 lg:grid-cols-3">
        {WEEKDAY_OPTIONS.map(({ value, label }) => (
          <Checkbox
            key={value}
            id={`openWeekdays.${value}`}
            name="openWeekdays"
            value={value}
            label={label}
            disabled={disabled}
            defaultChecked={dock?.openWeekdays.includes(value) ?? true}
          />
        ))}
      </div>
      {error ? <p className="font-semibold text-danger">Error: {error}</p> : null}
    </fieldset>
  );
}
