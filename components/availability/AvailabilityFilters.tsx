import { NumberInput } from '@/components/ui/NumberInput';
import { namedOptions } from '@/components/ui/options';
import { Select } from '@/components/ui/Select';
import { TextInput } from '@/components/ui/TextInput';
import { fieldError, type Failure } from '@/lib/client/api';
import type { AvailabilityAsked } from '@/lib/client/use-availability';

/** What availability is asked about: a dock, a planned outing, another day than today. */
export function AvailabilityFilters({
  docks,
  asked,
  onChange,
  failure,
}: {
  docks: readonly { id: string; name: string }[];
  asked: AvailabilityAsked;
  onChange: (asked: AvailabilityAsked) => void;
  failure: Failure | null;
}) {
  return (
    <form
      role="search"
      onSubmit={(event) => event.preventDefault()}
      className="grid grid-cols-[2fr_3fr] gap-4 *:min-w-0 sm:grid-cols-3 [&>:first-child]:col-span-full sm:[&>:first-child]:col-span-1"
    >
      <Select
        name="dockId"
        label="Dock"
        large
        options={[{ value: '', label: 'All docks' }, ...namedOptions(docks)]}
        value={asked.dockId ?? ''}
        onChange={(event) => onChange({ ...asked, dockId: event.target.value || undefined })}
      />
      <NumberInput
        name="hours"
        label="Planned outing"
        optional
        suffix="h"
        large
        value={asked.hours ?? ''}
        onChange={(event) => onChange({ ...asked, hours: event.target.value.replace(',', '.') || undefined })}
        error={fieldError(failure, 'hours')}
      />
      <TextInput
        name="on"
        type="date"
        label="Day"
        optional
        large
        value={asked.on ?? ''}
        onChange={(event) => onChange({ ...asked, on: event.target.value || undefined })}
        error={fieldError(failure, 'on')}
      />
    </form>
  );
}
