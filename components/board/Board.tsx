'use client';

import { useState } from 'react';
import { AsOf } from '@/components/availability/AsOf';
import { HoldList } from '@/components/availability/HoldList';
import { NoUnits } from '@/components/availability/NoUnits';
import { roomText, toWaterline } from '@/components/availability/room-words';
import { EmptyState } from '@/components/ui/EmptyState';
import { LinkButton } from '@/components/ui/LinkButton';
import { RadioGroup } from '@/components/ui/RadioGroup';
import { instantText, relativeText } from '@/components/ui/time-text';
import { DockWaterline } from '@/components/waterline/DockWaterline';
import { useAvailability } from '@/lib/client/use-availability';
import type { Availability, HeldUnit, OutUnit, ReadyUnit } from '@/lib/schemas/availability';
import { BoardRow } from './BoardRow';

type Dock = { id: string; name: string; timeZone: string };
type Shown = 'ready' | 'out' | 'held';

/** The dock's board: what may be launched, what is out, what is held; one tap to check out or in. */
export function Board({ dock, first, mayAdd }: { dock: Dock; first: Availability; mayAdd: boolean }) {
  const { data = first, failure } = useAvailability({ dockId: dock.id }, first);
  const [shown, setShown] = useState<Shown>('ready');
  if (data.ready.length + data.out.length + data.held.length === 0)
    return <NoUnits title={`No unit at ${dock.name} yet`} mayAdd={mayAdd} />;
  const options = [
    { value: 'ready', label: `Ready ${data.ready.length}` },
    { value: 'out', label: `Out ${data.out.length}` },
    { value: 'held', label: `Held ${data.held.length}` },
  ];
  return (
    <div className="grid gap-4">
      <RadioGroup
        name="show"
        label={<span className="sr-only">Show units that are</span>}
        look="segmented"
        large
        options={options}
        value={shown}
        onChange={(event) => setShown(event.target.value as Shown)}
      />
      {shown === 'ready' ? <ReadyRows units={data.ready} /> : null}
      {shown === 'out' ? <OutRows units={data.out} dock={dock} asOf={data.asOf} /> : null}
      {shown === 'held' ? <HeldRows units={data.held} dock={dock} /> : null}
      <AsOf at={data.asOf} failure={failure} timeZone={dock.timeZone} />
      <DockWaterline label={`The water line of ${dock.name}`} units={allUnits(data)} />
    </div>
  );
}

function allUnits(data: Availability) {
  return [
    ...data.held.map((unit) => toWaterline(unit, 'held', `/board/check-in/${unit.unitId}`)),
    ...data.ready.map((unit) => toWaterline(unit, 'ready', `/board/check-out/${unit.unitId}`)),
    ...data.out.map((unit) => toWaterline(unit, 'out', `/board/check-in/${unit.unitId}`)),
  ];
}

function ReadyRows({ units }: { units: ReadyUnit[] }) {
  if (units.length === 0)
    return <EmptyState title="No unit is ready">See under Out and Held where they are, and why.</EmptyState>;
  return (
    <ul>
      {units.map((unit) => (
        <li key={unit.unitId}>
          <BoardRow
            href={`/board/check-out/${unit.unitId}`}
            fleetNumber={unit.fleetNumber}
            modelName={unit.modelName}
            facts={roomText(unit)}
            act="Check out"
          />
        </li>
      ))}
    </ul>
  );
}

function OutRows({ units, dock, asOf }: { units: OutUnit[]; dock: Dock; asOf: string }) {
  if (units.length === 0)
    return <EmptyState title="No unit is out">What is checked out is listed here.</EmptyState>;
  return (
    <ul>
      {units.map((unit) => (
        <li key={unit.unitId}>
          <BoardRow
            href={`/board/check-in/${unit.unitId}`}
            fleetNumber={unit.fleetNumber}
            modelName={unit.modelName}
            facts={<OutFacts unit={unit} dock={dock} asOf={asOf} />}
            act="Check in"
          />
        </li>
      ))}
    </ul>
  );
}

function OutFacts({ unit, dock, asOf }: { unit: OutUnit; dock: Dock; asOf: string }) {
  const due = unit.dueBackAt ? new Date(unit.dueBackAt) : null;
  const late = due !== null && due < new Date(asOf);
  return (
    <>
      {unit.startedAt ? `Out since ${instantText(new Date(unit.startedAt), dock.timeZone)}. ` : 'Out. '}
      {due ? (
        <span className={late ? 'font-bold text-warn' : undefined}>
          {late ? 'Late: due back ' : 'Due back '}
          {relativeText(due, new Date(asOf))}, {instantText(due, dock.timeZone)}.
        </span>
      ) : null}
      {unit.holds.length > 0 ? <strong className="block text-held">Held when it comes back.</strong> : null}
    </>
  );
}

function HeldRows({ units, dock }: { units: HeldUnit[]; dock: Dock }) {
  if (units.length === 0)
    return <EmptyState title="No unit is held">Everything ashore may be launched.</EmptyState>;
  return (
    <ul>
      {units.map((unit) => (
        <li key={unit.unitId} className="grid gap-3 border-b-2 border-hairline py-3">
          <p className="flex flex-wrap items-baseline gap-x-3">
            <span className="numerals text-2xl font-bold">{unit.fleetNumber}</span>
            <span className="text-ink-soft">{unit.modelName}</span>
          </p>
          <HoldList holds={unit.holds} timeZone={dock.timeZone} />
          <div className="flex flex-wrap gap-2">
            <LinkButton size="large" href={`/units/${unit.unitId}`}>
              Open {unit.fleetNumber}
            </LinkButton>
            <LinkButton size="large" kind="quiet" href={`/board/check-in/${unit.unitId}`}>
              It was out: check in
            </LinkButton>
          </div>
        </li>
      ))}
    </ul>
  );
}
