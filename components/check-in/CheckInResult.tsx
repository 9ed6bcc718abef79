'use client';

import { useEffect, useState } from 'react';
import { HoldList } from '@/components/availability/HoldList';
import { roomText } from '@/components/availability/room-words';
import { StateMark } from '@/components/state/StateMark';
import { DescriptionList } from '@/components/ui/DescriptionList';
import { LinkButton } from '@/components/ui/LinkButton';
import { Notice } from '@/components/ui/Notice';
import { instantText } from '@/components/ui/time-text';
import { send } from '@/lib/client/api';
import type { UnitReadiness } from '@/lib/schemas/availability';
import type { CheckIn } from '@/lib/schemas/check-in';

/** What the check-in wrote, how the unit stands now, and who can undo it. */
export function CheckInResult({ unit, done }: { unit: UnitReadiness; done: CheckIn }) {
  const [now, setNow] = useState<UnitReadiness | null>(null);
  useEffect(() => {
    void send<UnitReadiness>('GET', `/api/v1/units/${unit.unitId}/readiness`).then((answer) => {
      if (answer.ok) setNow(answer.data);
    });
  }, [unit.unitId]);
  return (
    <div className="grid max-w-prose gap-5">
      <Notice tone="ok" title={`${unit.fleetNumber} is back`}>
        {done.hoursRun.toFixed(1)} h run, kept as of {instantText(new Date(done.at), unit.timeZone)}.
      </Notice>
      <DescriptionList
        items={[
          { term: 'Engine hours', detail: `${done.engineHours.toFixed(1)} h` },
          { term: 'Meter shows', detail: `${done.shownHours.toFixed(1)} h` },
          { term: 'Outings', detail: String(done.outings) },
        ]}
      />
      {done.review ? (
        <Notice tone="info" title="A manager looks at this reading">
          {done.review === 'late_arrival'
            ? 'It arrived after a later reading of this unit.'
            : 'It is more than usual, and was kept with your reason.'}
        </Notice>
      ) : null}
      {done.defectId ? <p>The defect is reported; the mechanic finds it among the tasks.</p> : null}
      <div aria-live="polite" className="grid gap-3">
        {now ? (
          <>
            <StateMark state={now.state} size="large" />
            {now.holds.length > 0 ? (
              <HoldList holds={now.holds} timeZone={now.timeZone} />
            ) : (
              <p>{roomText(now)}.</p>
            )}
          </>
        ) : null}
      </div>
      <LinkButton kind="primary" size="large" wide href={`/board?dockId=${unit.dockId}`}>
        Back to the board
      </LinkButton>
      <p className="text-ink-soft">
        Wrong number? A mechanic or manager can void the reading on the page of {unit.fleetNumber}, with a
        reason.
      </p>
    </div>
  );
}
