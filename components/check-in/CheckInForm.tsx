'use client';

import { useState, type FormEvent } from 'react';
import { Button } from '@/components/ui/Button';
import { Keypad } from '@/components/ui/Keypad';
import { Notice } from '@/components/ui/Notice';
import { Textarea } from '@/components/ui/Textarea';
import { Timestamp } from '@/components/ui/Timestamp';
import { fieldError, formError, send } from '@/lib/client/api';
import { entryId, forgetEntry } from '@/lib/client/entry-id';
import { useSend } from '@/lib/client/use-send';
import type { UnitReadiness } from '@/lib/schemas/availability';
import type { CheckIn } from '@/lib/schemas/check-in';
import { DefectFields } from './DefectFields';
import { describeRun, NOTHING, toBody, type Typed } from './entry';
import { SwapFields } from './SwapFields';

const FIELDS = [
  'hours',
  'confirmReason',
  'meterSwap.oldFinal',
  'meterSwap.newFirst',
  'defect.title',
  'defect.detail',
];

/** The meter's number and what may come with it: a new meter, a defect, a reason. */
export function CheckInForm({
  unit,
  now,
  onDone,
}: {
  unit: UnitReadiness;
  now: string;
  onDone: (done: CheckIn) => void;
}) {
  const [typed, setTyped] = useState<Typed>(NOTHING);
  const [asked, setAsked] = useState(false);
  const { busy, failure, run, forget } = useSend();
  const change = (part: Partial<Typed>) => {
    setTyped((before) => ({ ...before, ...part }));
    forget();
  };
  const what = `check-in:${unit.unitId}:${unit.readAt}:${unit.outings}:${unit.outingId ?? ''}`;
  async function submit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const answer = await run(async () => {
      const sent = await send<CheckIn>(
        'POST',
        '/api/v1/check-ins',
        toBody(entryId(what), unit.unitId, typed),
      );
      if (!sent.ok && sent.code === 'reason_needed') setAsked(true);
      return sent;
    });
    if (!answer) return;
    forgetEntry(what);
    onDone(answer.data);
  }
  const ran = describeRun(typed, unit.shownHours);
  const error = formError(failure, FIELDS);
  return (
    <form
      onSubmit={(event) => void submit(event)}
      noValidate
      className="grid items-start gap-6 lg:grid-cols-2 lg:gap-10"
    >
      <div className="grid max-w-md gap-4">
        <p className="border-l-4 border-line pl-3">
          Last reading <strong className="numerals text-xl">{unit.shownHours.toFixed(1)} h</strong>
          <br />
          <Timestamp at={unit.readAt} now={now} timeZone={unit.timeZone} />
        </p>
        <Keypad
          name="hours"
          label={typed.swapped ? 'The new meter shows now' : 'The meter shows'}
          suffix="h"
          value={typed.hours}
          onChange={(hours) => change({ hours })}
          error={fieldError(failure, 'hours')}
        />
        <p
          aria-live="polite"
          className={ran?.lower ? 'min-h-7 text-lg font-bold text-warn' : 'min-h-7 text-lg'}
        >
          {ran?.text ?? ''}
        </p>
      </div>
      <div className="grid max-w-prose gap-4">
        {asked ? (
          <Textarea
            name="confirmReason"
            label="Why so many hours?"
            hint="A manager looks at this reading later."
            rows={2}
            maxLength={500}
            value={typed.reason}
            onChange={(event) => change({ reason: event.target.value })}
            error={fieldError(failure, 'confirmReason')}
          />
        ) : null}
        <DefectFields typed={typed} onChange={change} failure={failure} />
        <SwapFields typed={typed} onChange={change} failure={failure} />
        {error ? (
          <Notice
            tone="danger"
            title={failure?.code === 'connection_lost' ? 'Not sent yet' : 'Not checked in'}
          >
            {error}
            {failure?.code === 'connection_lost' ? (
              <p>What you typed is kept; tapping again sends it once.</p>
            ) : null}
          </Notice>
        ) : null}
        <Button type="submit" kind="primary" size="large" wide busy={busy} disabled={typed.hours === ''}>
          {busy ? 'Checking in' : `Check in ${unit.fleetNumber}`}
        </Button>
        {unit.outingId ? null : (
          <p className="text-ink-soft">
            {unit.fleetNumber} was not checked out. The reading is kept and counts as an outing whose start is
            unknown.
          </p>
        )}
      </div>
    </form>
  );
}
