import type { Metadata } from 'next';
import { FleetFilters } from '@/components/units/FleetFilters';
import { FleetPicture } from '@/components/units/FleetPicture';
import { UnitTable } from '@/components/units/UnitTable';
import { EmptyState } from '@/components/ui/EmptyState';
import { LinkButton } from '@/components/ui/LinkButton';
import { PageHeader } from '@/components/ui/PageHeader';
import { openFleet } from '@/lib/actions/open-fleet';
import { pageContext } from '@/lib/auth/page';
import { fleetFilter } from '@/lib/schemas/fleet';

export const metadata: Metadata = { title: 'Units' };

type Query = Record<string, string | string[] | undefined>;

export default async function UnitsPage({ searchParams }: { searchParams: Promise<Query> }) {
  const filter = fleetFilter.parse(await searchParams);
  const { units, docks, models, empty, mayAdd } = await openFleet(await pageContext(), filter);
  const add = (label: string) =>
    mayAdd ? (
      <LinkButton kind="primary" href="/units/new">
        {label}
      </LinkButton>
    ) : null;
  if (empty)
    return (
      <>
        <PageHeader title="Units" />
        <EmptyState title="No unit yet" action={add('Add the first unit')}>
          {mayAdd
            ? 'A unit is one craft of the fleet. Once it is here, its hours can be logged and its work comes due.'
            : 'A unit is one craft of the fleet. A manager adds the first one.'}
        </EmptyState>
      </>
    );
  return (
    <>
      <PageHeader title="Units" actions={add('Add a unit')} />
      <div className="grid gap-8">
        <FleetPicture units={units} />
        <FleetFilters docks={docks} models={models} filter={filter} />
        {units.length === 0 ? (
          <EmptyState
            title="No unit fits what you chose"
            action={<LinkButton href="/units">Show all units</LinkButton>}
          >
            Choose another dock, model or state above.
          </EmptyState>
        ) : (
          <UnitTable units={units} />
        )}
      </div>
    </>
  );
}
