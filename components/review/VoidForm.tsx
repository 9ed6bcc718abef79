'use client';

import { useRouter } from 'next/navigation';
import type { FormEvent } from 'react';
import { Button } from '@/components/ui/Button';
import { Checkbox } from '@/components/ui/Checkbox';
import { Notice } from '@/components/ui/Notice';
import { NumberInput } from '@/components/ui/NumberInput';
import { Textarea } from '@/components/ui/Textarea';
import { useToast } from '@/components/ui/Toast';
import { fieldError, formError, send } from '@/lib/client/api';
import { textOf } from '@/lib/client/form-values';
import { useSend } from '@/lib/client/use-send';
import type { Reading } from '@/lib/schemas/reading';

const FIELDS = ['reason', 'replacement.hours'];

/** Voids a reading with a reason, and puts what the meter did show in its place. Both are kept. */
export function VoidForm({ reading, onDone }: { reading: Reading; onDone: () => void }) {
  const router = useRouter();
  const toast = useToast();
  const { busy, failure, run } = useSend();
  async function submit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const form = event.currentTarget;
    const hours = textOf(form, 'replacement.hours').replace(',', '.');
    const answer = await run(() =>
      send('POST', `/api/v1/readings/${reading.id}/voiding`, {
        reason: textOf(form, 'reason'),
        ...(hours && { replacement: { hours: /^\d+(\.\d*)?$/.test(hours) ? Number(hours) : hours } }),
        ...(textOf(form, 'noOuting') && { outingHappened: false }),
      }),
    );
    if (!answer) return;
    toast({ text: `The reading of ${reading.fleetNumber} is void.` });
    onDone();
    router.refresh();
  }
  const error = formError(failure, FIELDS);
  return (
    <form onSubmit={(event) => void submit(event)} noValidate className="grid gap-5">
      {error ? <Notice tone="danger">{error}</Notice> : null}
      <Textarea
        name="reason"
        label="Why it is wrong"
        rows={2}
        maxLength={500}
        error={fieldError(failure, 'reason')}
      />
      <NumberInput
        name="replacement.hours"
        label="What the meter showed then"
        hint={`It was kept as ${reading.shownHours.toFixed(1)} h. Left empty, the reading before it counts.`}
        optional
        suffix="h"
        large
        error={fieldError(failure, 'replacement.hours')}
      />
      {reading.outingId ? (
        <Checkbox name="noOuting" value="yes" label="The outing never happened: void it too" />
      ) : null}
      <Button type="submit" kind="danger" size="large" busy={busy}>
        Void the reading
      </Button>
    </form>
  );
}
