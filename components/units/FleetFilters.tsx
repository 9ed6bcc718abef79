import { Button } from '@/components/ui/Button';
import { LinkButton } from '@/components/ui/LinkButton';
import { namedOptions } from '@/components/ui/options';
import { Select } from '@/components/ui/Select';

const STATES = [
  { value: 'ready', label: 'Ready' },
  { value: 'out', label: 'Out' },
  { value: 'held', label: 'Held' },
  { value: 'retired', label: 'Retired' },
];

type Named = { id: string; name: string };
export type Filter = { dock?: string | undefined; model?: string | undefined; state?: string | undefined };

/** Narrows the list of units; a plain form, so that the address says what is shown. */
export function FleetFilters({ docks, models, filter }: { docks: Named[]; models: Named[]; filter: Filter }) {
  const narrowed = Object.values(filter).some(Boolean);
  return (
    <form
      method="get"
      className="no-print grid items-end gap-3 sm:grid-cols-2 lg:grid-cols-[1fr_1fr_1fr_auto]"
    >
      <Select
        label="Dock"
        name="dock"
        placeholder="Every dock"
        options={namedOptions(docks)}
        defaultValue={filter.dock ?? ''}
      />
      <Select
        label="Model"
        name="model"
        placeholder="Every model"
        options={namedOptions(models)}
        defaultValue={filter.model ?? ''}
      />
      <Select
        label="State"
        name="state"
        placeholder="In service, any state"
        options={STATES}
        defaultValue={filter.state ?? ''}
      />
      <div className="flex flex-wrap gap-2">
        <Button type="submit">Show</Button>
        {narrowed ? (
          <LinkButton kind="quiet" href="/units">
            Show all
          </LinkButton>
        ) : null}
      </div>
    </form>
  );
}
