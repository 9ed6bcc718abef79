import type { ReactNode } from 'react';
import Link from 'next/link';
import { StateMark } from '@/components/state/StateMark';
import type { UnitState } from '@/components/state/state-words';
import { EmptyState } from '@/components/ui/EmptyState';
import { instantText, relativeText } from '@/components/ui/time-text';
import type { Availability, OutUnit } from '@/lib/schemas/availability';
import { HoldList } from './HoldList';
import { roomText } from './room-words';

type Docks = readonly { id: string; name: string; timeZone: string }[];

/** Held first, as it costs hire; then what is ready, then what is out. */
export function AvailabilityLists({ data, docks }: { data: Availability; docks: Docks }) {
  const zone = (dockId: string) => docks.find(({ id }) => id === dockId)?.timeZone ?? 'UTC';
  const dockName = (dockId: string) => docks.find(({ id }) => id === dockId)?.name ?? '';
  return (
    <div className="grid gap-8">
      <Section state="held" count={data.held.length} none="Everything ashore may be launched.">
        {data.held.map((unit) => (
          <Row key={unit.unitId} unit={unit} dock={dockName(unit.dockId)}>
            <HoldList holds={unit.holds} timeZone={zone(unit.dockId)} />
          </Row>
        ))}
      </Section>
      <Section
        state="ready"
        count={data.ready.length}
        none="Nothing may be launched now: see why under Held."
      >
        {data.ready.map((unit) => (
          <Row key={unit.unitId} unit={unit} dock={dockName(unit.dockId)}>
            <p>{roomText(unit)}</p>
          </Row>
        ))}
      </Section>
      <Section state="out" count={data.out.length} none="Every unit is ashore.">
        {data.out.map((unit) => (
          <Row key={unit.unitId} unit={unit} dock={dockName(unit.dockId)}>
            <OutText unit={unit} asOf={data.asOf} timeZone={zone(unit.dockId)} />
          </Row>
        ))}
      </Section>
    </div>
  );
}

function Section({
  state,
  count,
  none,
  children,
}: {
  state: UnitState;
  count: number;
  none: string;
  children: ReactNode;
}) {
  return (
    <section aria-labelledby={`units-${state}`}>
      <h2 id={`units-${state}`} className="mb-2">
        <StateMark state={state} size="large" detail={String(count)} />
      </h2>
      {count === 0 ? (
        <EmptyState title={`No unit is ${state}`}>{none}</EmptyState>
      ) : (
        <ul className="grid gap-x-10 lg:grid-cols-2">{children}</ul>
      )}
    </section>
  );
}

function Row({
  unit,
  dock,
  children,
}: {
  unit: { unitId: string; fleetNumber: string; modelName: string };
  dock: string;
  children: ReactNode;
}) {
  return (
    <li className="grid content-start gap-2 border-b border-hairline py-3">
      <p className="flex flex-wrap items-center gap-x-3">
        <Link
          href={`/units/${unit.unitId}`}
          className="link numerals inline-flex min-h-target min-w-target items-center text-xl font-bold"
        >
          {unit.fleetNumber}
        </Link>
        <span className="text-ink-soft">
          {unit.modelName} · {dock}
        </span>
      </p>
      {children}
    </li>
  );
}

function OutText({ unit, asOf, timeZone }: { unit: OutUnit; asOf: string; timeZone: string }) {
  const due = unit.dueBackAt ? new Date(unit.dueBackAt) : null;
  const late = due !== null && due < new Date(asOf);
  return (
    <>
      <p>
        {unit.startedAt ? `Out since ${instantText(new Date(unit.startedAt), timeZone)}. ` : null}
        {due ? (
          <span className={late ? 'font-bold text-warn' : undefined}>
            {late ? 'Late: due back ' : 'Due back '}
            {relativeText(due, new Date(asOf))}, {instantText(due, timeZone)}.
          </span>
        ) : null}
      </p>
      {unit.holds.length > 0 ? (
        <>
          <p className="font-bold text-held">Held when it comes back:</p>
          <HoldList holds={unit.holds} timeZone={timeZone} />
        </>
      ) : null}
    </>
  );
}
