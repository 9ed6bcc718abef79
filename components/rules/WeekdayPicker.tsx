import { FieldError } from '@/components/ui/Field';
import { WEEKDAYS, type Weekday } from '@/lib/domain/calendar-day';
import { WEEKDAY_NAMES } from '@/lib/domain/words';

/** Which days of the week. */
export function WeekdayPicker({
  id,
  value,
  error,
  disabled,
  onChange,
}: {
  id: string;
  value: readonly Weekday[];
  error?: string;
  disabled: boolean;
  onChange: (value: Weekday[]) => void;
}) {
  return (
    <fieldset className="grid min-w-0 gap-1.5" aria-describedby={error ? `${id}-error` : undefined}>
      <legend className="float-left mb-1.5 font-semibold">On</legend>
      <div className="flex flex-wrap gap-x-5">
        {WEEKDAYS.map((day, index) => (
          <label key={day} className="flex min-h-target cursor-pointer items-center gap-2">
            <input
              type="checkbox"
              className="size-6 shrink-0"
              checked={value.includes(day)}
              disabled={disabled}
              onChange={(event) =>
                onChange(event.target.checked ? [...value, day] : value.filter((other) => other !== day))
              }
            />
            {WEEKDAY_NAMES[index]}
          </label>
        ))}
      </div>
      {error ? <FieldError id={id}>{error}</FieldError> : null}
    </fieldset>
  );
}
