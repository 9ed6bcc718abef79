import { RadioGroup } from '@/components/ui/RadioGroup';
import { TextInput } from '@/components/ui/TextInput';

export type When = { when: 'now' | 'earlier'; day: string; time: string };

/** Whether work was done just now or earlier, and then on which day and at what time by the dock's clock. */
export function WhenFields({
  value,
  today,
  error,
  onChange,
}: {
  value: When;
  today: string;
  error?: string;
  onChange: (value: When) => void;
}) {
  return (
    <>
      <RadioGroup
        name="when"
        label="When was it done?"
        look="segmented"
        options={[
          { value: 'now', label: 'Just now' },
          { value: 'earlier', label: 'Earlier' },
        ]}
        value={value.when}
        onChange={(event) =>
          onChange({ ...value, when: event.target.value === 'earlier' ? 'earlier' : 'now' })
        }
      />
      {value.when === 'earlier' ? (
        <div className="flex flex-wrap gap-3">
          <TextInput
            id="at"
            type="date"
            label="Day"
            value={value.day}
            max={today}
            error={error}
            onChange={(event) => onChange({ ...value, day: event.target.value })}
          />
          <TextInput
            type="time"
            label="Time at the dock"
            value={value.time}
            onChange={(event) => onChange({ ...value, time: event.target.value })}
          />
        </div>
      ) : null}
    </>
  );
}
