'use client';

import { useState } from 'react';
import { Notice } from '@/components/ui/Notice';
import { FleetWaterline } from '@/components/waterline/FleetWaterline';
import { useAvailability, type AvailabilityAsked } from '@/lib/client/use-availability';
import type { Availability } from '@/lib/schemas/availability';
import { AsOf } from './AsOf';
import { AvailabilityFilters } from './AvailabilityFilters';
import { AvailabilityLists } from './AvailabilityLists';
import { NoUnits } from './NoUnits';
import { toWaterline } from './room-words';

export type NamedDock = { id: string; name: string; timeZone: string };

/** Which units may be hired out, of which docks, for how long, on which day: kept up to date while it is seen. */
export function AvailabilityScreen({
  docks,
  first,
  mayAdd,
}: {
  docks: NamedDock[];
  first: Availability;
  mayAdd: boolean;
}) {
  const [asked, setAsked] = useState<AvailabilityAsked>({});
  const isFirst = !asked.dockId && !asked.on && !asked.hours;
  const { data = first, failure } = useAvailability(asked, isFirst ? first : undefined);
  const refused = failure?.code === 'invalid_input' ? failure : null;
  const shownDocks = asked.dockId ? docks.filter(({ id }) => id === asked.dockId) : docks;
  const zone = (shownDocks[0] ?? docks[0])?.timeZone ?? 'UTC';
  const empty = data.held.length + data.ready.length + data.out.length === 0;
  if (empty && isFirst) return <NoUnits title="No unit yet" mayAdd={mayAdd} />;
  return (
    <div className="grid gap-6">
      <AvailabilityFilters docks={docks} asked={asked} onChange={setAsked} failure={refused} />
      {refused ? <Notice tone="warn">The list below is of before: {refused.detail}</Notice> : null}
      <AsOf at={data.asOf} failure={refused ? null : failure} timeZone={zone} />
      <section>
        <h2 className="mb-2 text-2xl">By dock</h2>
        <FleetWaterline
          label="The water line of each dock"
          docks={shownDocks.map((dock) => toDock(dock, data))}
        />
      </section>
      {empty ? (
        <NoUnits title="No unit at this dock" mayAdd={mayAdd} />
      ) : (
        <AvailabilityLists data={data} docks={docks} />
      )}
    </div>
  );
}

function toDock(dock: NamedDock, data: Availability) {
  const here = ({ dockId }: { dockId: string }) => dockId === dock.id;
  const href = (unitId: string) => `/units/${unitId}`;
  return {
    key: dock.id,
    name: dock.name,
    href: `/board?dockId=${dock.id}`,
    units: [
      ...data.held.filter(here).map((unit) => toWaterline(unit, 'held', href(unit.unitId))),
      ...data.ready.filter(here).map((unit) => toWaterline(unit, 'ready', href(unit.unitId))),
      ...data.out.filter(here).map((unit) => toWaterline(unit, 'out', href(unit.unitId))),
    ],
  };
}
