import { Checkbox } from '@/components/ui/Checkbox';
import { Select } from '@/components/ui/Select';
import { TextInput } from '@/components/ui/TextInput';

/** Name, time zone and season of the first dock. */
export function FirstDockFields({
  timeZones,
  allYear,
  onAllYear,
  error,
}: {
  timeZones: string[];
  allYear: boolean;
  onAllYear: (allYear: boolean) => void;
  error: (path: string) => string | undefined;
}) {
  return (
    <>
      <TextInput name="dock.name" label="Name of the dock" error={error('dock.name')} large />
      <Select
        name="dock.timeZone"
        label="Time zone"
        hint="The dock's days begin and end by it."
        placeholder="Choose a time zone"
        options={timeZones.map((zone) => ({ value: zone, label: zone.replaceAll('_', ' ') }))}
        defaultValue=""
        error={error('dock.timeZone')}
        large
      />
      <Checkbox
        label="Open all year"
        checked={allYear}
        onChange={(event) => onAllYear(event.target.checked)}
      />
      {allYear ? null : (
        <div className="grid gap-5 sm:grid-cols-2">
          <TextInput
            name="dock.season.from"
            label="First day of the season"
            hint="Month and day, as 05-15."
            error={error('dock.season.from')}
            large
          />
          <TextInput
            name="dock.season.to"
            label="Last day of the season"
            hint="Month and day, as 09-30."
            error={error('dock.season.to')}
            large
          />
        </div>
      )}
    </>
  );
}
