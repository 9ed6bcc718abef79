'use client';

import { useRouter } from 'next/navigation';
import { useState, type FormEvent } from 'react';
import { SpecRows } from '@/components/models/SpecRows';
import { draftSpecs, readSpecs, showSpecs, specLabels, type SpecDraft } from '@/components/models/spec-draft';
import { Section } from '@/components/rules/Section';
import { Button } from '@/components/ui/Button';
import { ErrorSummary } from '@/components/ui/ErrorSummary';
import { LinkButton } from '@/components/ui/LinkButton';
import { useToast } from '@/components/ui/Toast';
import { fieldError, refusedHere, send } from '@/lib/client/api';
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
  const [rows, setRows] = useState<SpecDraft[]>(() => draftSpecs(unit?.specs ?? {}));

  async function submit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const form = event.currentTarget;
    const done = await run<Unit>(async () => {
      if (!unit) return send('POST', '/api/v1/units', readNew(form));
      const read = readSpecs(rows);
      if ('errors' in read) return refusedHere(read.errors);
      return send('PATCH', `/api/v1/units/${unit.id}`, { ...readChange(form), specs: read.specs });
    });
    if (!done) return;
    setLeft(true);
    toast({ text: unit ? `${done.data.fleetNumber} is saved.` : `${done.data.fleetNumber} is added.` });
    router.push(`/units/${done.data.id}`);
    router.refresh();
  }

  const shown = showSpecs(failure, rows);
  return (
    <form noValidate className="grid max-w-4xl gap-8" onSubmit={(event) => void submit(event)}>
      <ErrorSummary
        errors={listErrors(shown, { ...LABELS, ...specLabels(rows) })}
        title="The unit is not saved"
      />
      <UnitFields data={data} error={(path) => fieldError(shown, path)} />
      {unit ? (
        <Section
          title="Specs of its own"
          hint="Only where this unit differs from its model, which stands for all that is left empty here."
        >
          <SpecRows
            rows={rows}
            disabled={false}
            error={(path) => fieldError(shown, path)}
            onChange={setRows}
          />
        </Section>
      ) : null}
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
