'use client';

import { useState } from 'react';
import { HoldList } from '@/components/availability/HoldList';
import { roomText } from '@/components/availability/room-words';
import { LinkButton } from '@/components/ui/LinkButton';
import { Notice } from '@/components/ui/Notice';
import { instantText } from '@/components/ui/time-text';
import type { UnitReadiness } from '@/lib/schemas/availability';
import type { CheckOut as CheckedOut } from '@/lib/schemas/check-out';
import { CheckOutForm } from './CheckOutForm';

/** Hiring one unit out, or why it may not go. */
export function CheckOut({ unit, now }: { unit: UnitReadiness; now: string }) {
  const [done, setDone] = useState<CheckedOut | null>(null);
  if (done) return <Done unit={unit} done={done} />;
  if (unit.state === 'out')
    return (
      <Notice
        tone="info"
        still
        title={`${unit.fleetNumber} is out`}
        action={
          <LinkButton kind="primary" size="large" href={`/board/check-in/${unit.unitId}`}>
            Check it in
          </LinkButton>
        }
      >
        {unit.startedAt ? `Since ${instantText(new Date(unit.startedAt), unit.timeZone)}.` : null}
      </Notice>
    );
  if (unit.state === 'held')
    return (
      <div className="grid max-w-prose gap-4">
        <Notice tone="danger" still title={`${unit.fleetNumber} is held and may not go out`} />
        <HoldList holds={unit.holds} timeZone={unit.timeZone} />
        <div className="flex flex-wrap gap-2">
          <BoardLink unit={unit} />
        </div>
      </div>
    );
  return (
    <div className="grid max-w-prose gap-5">
      <p className="text-lg">{roomText(unit)}.</p>
      <CheckOutForm unit={unit} now={now} onDone={setDone} />
      <p>
        <LinkButton kind="quiet" size="large" href={`/board/check-in/${unit.unitId}`}>
          It is back already: check it in
        </LinkButton>
      </p>
    </div>
  );
}

function Done({ unit, done }: { unit: UnitReadiness; done: CheckedOut }) {
  return (
    <div className="grid max-w-prose gap-4">
      <Notice tone="ok" title={`${unit.fleetNumber} is out`}>
        Since {instantText(new Date(done.at), unit.timeZone)}.{' '}
        {done.dueBackAt ? `Due back ${instantText(new Date(done.dueBackAt), unit.timeZone)}.` : null}
      </Notice>
      <div className="flex flex-wrap gap-2">
        <BoardLink unit={unit} />
        <LinkButton kind="quiet" size="large" href={`/board/check-in/${unit.unitId}`}>
          Check it in again
        </LinkButton>
      </div>
    </div>
  );
}

function BoardLink({ unit }: { unit: UnitReadiness }) {
  return (
    <LinkButton kind="primary" size="large" href={`/board?dockId=${unit.dockId}`}>
      Back to the board
    </LinkButton>
  );
}
