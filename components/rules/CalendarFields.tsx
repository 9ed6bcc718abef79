import { NumberInput } from '@/components/ui/NumberInput';
import { Select } from '@/components/ui/Select';
import { TextInput } from '@/components/ui/TextInput';
import { ordinal } from '@/lib/domain/words';
import type { CalendarDraft } from './calendar-draft';
import type { FormState } from './form-state';
import type { TriggerDraft } from './rule-draft';
import { WeekdayPicker } from './WeekdayPicker';

const WAYS: { value: CalendarDraft['way']; label: string }[] = [
  { value: 'step', label: 'Every so many days, weeks, months or years' },
  { value: 'weekdays', label: 'On weekdays' },
  { value: 'month_day', label: 'On a day of the month' },
  { value: 'text', label: 'Write it yourself' },
];
const FREQUENCIES: { value: CalendarDraft['frequency']; label: string }[] = [
  { value: 'DAILY', label: 'days' },
  { value: 'WEEKLY', label: 'weeks' },
  { value: 'MONTHLY', label: 'months' },
  { value: 'YEARLY', label: 'years' },
];
const MONTH_DAYS = [
  ...Array.from({ length: 31 }, (_, index) => ({ value: String(index + 1), label: ordinal(index + 1) })),
  { value: '-1', label: 'last day' },
];

/** How a calendar trigger recurs, and from which day. */
export function CalendarFields({
  form,
  trigger,
  path,
  put,
}: {
  form: FormState;
  trigger: TriggerDraft;
  path: string;
  put: (field: string, part: Partial<TriggerDraft>) => void;
}) {
  const { calendar } = trigger;
  const set = (part: Partial<CalendarDraft>) => put('rrule', { calendar: { ...calendar, ...part } });
  const error = form.errorOf(`${path}.rrule`);
  const interval = (suffix?: string) => (
    <NumberInput
      label="Every"
      id={`${path}.rrule`}
      whole
      suffix={suffix}
      value={calendar.interval}
      readOnly={form.readOnly}
      error={calendar.way === 'weekdays' && calendar.weekdays.length === 0 ? undefined : error}
      onChange={(event) => set({ interval: event.target.value })}
    />
  );
  return (
    <div className="grid gap-4">
      <Select
        label="On the calendar"
        id={`${path}.way`}
        options={WAYS}
        value={calendar.way}
        disabled={form.readOnly}
        onChange={(event) => set({ way: event.target.value as CalendarDraft['way'] })}
      />
      <div className="grid gap-4 sm:grid-cols-2">
        {calendar.way === 'step' ? (
          <>
            {interval()}
            <Select
              label="Unit of time"
              id={`${path}.frequency`}
              options={FREQUENCIES}
              value={calendar.frequency}
              disabled={form.readOnly}
              onChange={(event) => set({ frequency: event.target.value as CalendarDraft['frequency'] })}
            />
          </>
        ) : null}
        {calendar.way === 'weekdays' ? interval('weeks') : null}
        {calendar.way === 'month_day' ? (
          <>
            {interval('months')}
            <Select
              label="On the"
              id={`${path}.month-day`}
              options={MONTH_DAYS}
              value={calendar.monthDay}
              disabled={form.readOnly}
              onChange={(event) => set({ monthDay: event.target.value })}
            />
          </>
        ) : null}
      </div>
      {calendar.way === 'weekdays' ? (
        <WeekdayPicker
          id={`${path}.weekdays`}
          value={calendar.weekdays}
          disabled={form.readOnly}
          error={calendar.weekdays.length === 0 ? 'Choose at least one weekday' : undefined}
          onChange={(weekdays) => set({ weekdays })}
        />
      ) : null}
      {calendar.way === 'text' ? (
        <TextInput
          label="Recurrence rule"
          hint="As in RFC 5545, dates only: FREQ=MONTHLY;BYDAY=1MO is the first Monday of each month."
          id={`${path}.rrule`}
          spellCheck={false}
          autoCapitalize="characters"
          value={calendar.text}
          readOnly={form.readOnly}
          error={error}
          onChange={(event) => set({ text: event.target.value })}
        />
      ) : null}
      <TextInput
        label="From"
        type="date"
        id={`${path}.start`}
        className="max-w-60"
        value={trigger.start}
        readOnly={form.readOnly}
        error={form.errorOf(`${path}.start`)}
        onChange={(event) => put('start', { start: event.target.value })}
      />
    </div>
  );
}
