'use client';

import { useRouter } from 'next/navigation';
import { useState, type FormEvent } from 'react';
import { Button } from '@/components/ui/Button';
import { ErrorSummary } from '@/components/ui/ErrorSummary';
import { LinkButton } from '@/components/ui/LinkButton';
import { useToast } from '@/components/ui/Toast';
import { fieldError, send } from '@/lib/client/api';
import { numberOf, textOf } from '@/lib/client/form-values';
import { listErrors } from '@/lib/client/list-errors';
import { useSend } from '@/lib/client/use-send';
import type { UnitFormData } from '@/lib/schemas/fleet';
import type { Unit } from '@/lib/schemas/unit';
import { UnitFields } from './UnitFields';

const LABELS = {
  fleetNumber: 'Fleet number',
  modelId: 'Model',
  dockId: 'Dock',
  hin: 'Hull number (HIN)',
  registration: 'Registration',
  enteredServiceOn: 'In service since',
  engineHours: 'Meter now',
  outings: 'Outings so far',
  carbCount: 'Carburettors',
};

/** Adds a unit, or changes one. */
export function UnitForm({ data }: { data: UnitFormData }) {
  const router = useRouter();
  const toast = useToast();
  const { busy, failure, run } = useSend();
  const [left, setLeft] = useState(false);
  const { unit } = data;

  async function submit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const body = unit ? readChange(event.currentTarget) : readNew(event.currentTarget);
    const done = await run(() =>
      unit
        ? send<Unit>('PATCH', `/api/v1/units/${unit.id}`, body)
        : send<Unit>('POST', '/api/v1/units', body),
    );
    if (!done) return;
    setLeft(true);
    toast({ text: unit ? `${done.data.fleetNumber} is saved.` : `${done.data.fleetNumber} is added.` });
    router.push(`/units/${done.data.id}`);
    router.refresh();
  }

  return (
    <form noValidate className="grid max-w-3xl gap-8" onSubmit={(event) => void submit(event)}>
      <ErrorSummary errors={listErrors(failure, LABELS)} title="The unit is not saved" />
      <UnitFields data={data} error={(path) => fieldError(failure, path)} />
      <div className="flex flex-wrap gap-3 border-t-2 border-line pt-4">
        <Button type="submit" kind="primary" size="large" busy={busy || left}>
          {unit ? 'Save' : 'Add the unit'}
        </Button>
        <LinkButton kind="quiet" size="large" href={unit ? `/units/${unit.id}` : '/units'}>
          Cancel
        </LinkButton>
      </div>
    </form>
  );
}

function readShared(form: HTMLFormElement) {
  return {
    fleetNumber: textOf(form, 'fleetNumber'),
    modelId: textOf(form, 'modelId'),
    dockId: textOf(form, 'dockId'),
    enteredServiceOn: textOf(form, 'enteredServiceOn'),
  };
}

/** Optional fields left empty are left out. */
function readNew(form: HTMLFormElement) {
  return {
    ...readShared(form),
    hin: textOf(form, 'hin') || undefined,
    registration: textOf(form, 'registration') || undefined,
    engineHours: numberOf(form, 'engineHours'),
    outings: numberOf(form, 'outings'),
    carbCount: numberOf(form, 'carbCount'),
  };
}

/** Optional fields left empty are taken away. */
function readChange(form: HTMLFormElement) {
  return {
    ...readShared(form),
    hin: textOf(form, 'hin') || null,
    registration: textOf(form, 'registration') || null,
    carbCount: numberOf(form, 'carbCount') ?? null,
  };
}
