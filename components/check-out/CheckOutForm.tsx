'use client';

import { useState, type FormEvent } from 'react';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import { RadioGroup } from '@/components/ui/RadioGroup';
import { TextInput } from '@/components/ui/TextInput';
import { instantText } from '@/components/ui/time-text';
import { send } from '@/lib/client/api';
import { entryId, forgetEntry } from '@/lib/client/entry-id';
import { textOf } from '@/lib/client/form-values';
import { useSend } from '@/lib/client/use-send';
import type { UnitReadiness } from '@/lib/schemas/availability';
import type { CheckOut } from '@/lib/schemas/check-out';

const LENGTHS = ['0.5', '1', '1.5', '2', '3', '4'];
const HOUR_MS = 3_600_000;

/** How long the outing is planned to be and, if wanted, for whom. One tap sends it. */
export function CheckOutForm({
  unit,
  now,
  onDone,
}: {
  unit: UnitReadiness;
  now: string;
  onDone: (done: CheckOut) => void;
}) {
  const { busy, failure, run } = useSend();
  const [planned, setPlanned] = useState('1');
  const what = `check-out:${unit.unitId}:${unit.readAt}`;
  const dueBack = (from: Date) =>
    planned === '' ? undefined : new Date(from.getTime() + Number(planned) * HOUR_MS);
  async function submit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const renterReference = textOf(event.currentTarget, 'renterReference');
    const answer = await run(() =>
      send<CheckOut>('POST', '/api/v1/check-outs', {
        id: entryId(what),
        unitId: unit.unitId,
        ...(planned !== '' && {
          plannedHours: Number(planned),
          dueBackAt: dueBack(new Date())?.toISOString(),
        }),
        ...(renterReference && { renterReference }),
      }),
    );
    if (!answer) return;
    forgetEntry(what);
    onDone(answer.data);
  }
  const due = dueBack(new Date(now));
  return (
    <form onSubmit={(event) => void submit(event)} noValidate className="grid gap-5">
      {failure ? (
        <Notice tone="danger" title={failure.code === 'connection_lost' ? 'Not sent yet' : 'Not checked out'}>
          {failure.errors.length > 0 ? (
            failure.errors.map(({ message }) => <p key={message}>{message}</p>)
          ) : (
            <p>{failure.detail}</p>
          )}
          {failure.code === 'connection_lost' ? (
            <p>What you entered is kept; tapping again sends it once.</p>
          ) : null}
        </Notice>
      ) : null}
      <RadioGroup
        name="planned"
        label="Planned outing"
        look="segmented"
        large
        hint={due ? `Due back about ${instantText(due, unit.timeZone)}.` : 'No time back is noted.'}
        options={[
          ...LENGTHS.map((hours) => ({ value: hours, label: `${hours} h` })),
          { value: '', label: 'Not said' },
        ]}
        value={planned}
        onChange={(event) => setPlanned(event.target.value)}
      />
      <TextInput
        name="renterReference"
        label="Renter’s reference"
        optional
        large
        maxLength={80}
        autoComplete="off"
      />
      <Button type="submit" kind="primary" size="large" wide busy={busy}>
        {busy ? 'Checking out' : `Check out ${unit.fleetNumber}`}
      </Button>
    </form>
  );
}
