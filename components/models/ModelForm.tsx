'use client';

import { useRouter } from 'next/navigation';
import { useState, type FormEvent } from 'react';
import { Section } from '@/components/rules/Section';
import { Button } from '@/components/ui/Button';
import { ErrorSummary } from '@/components/ui/ErrorSummary';
import { LinkButton } from '@/components/ui/LinkButton';
import { TextInput } from '@/components/ui/TextInput';
import { useToast } from '@/components/ui/Toast';
import { fieldError, refusedHere, send } from '@/lib/client/api';
import { numberOf, textOf } from '@/lib/client/form-values';
import { listErrors } from '@/lib/client/list-errors';
import { useSend } from '@/lib/client/use-send';
import type { Model } from '@/lib/schemas/model';
import { EngineFields } from './EngineFields';
import { draftSpecs, readSpecs, showSpecs, specLabels, type SpecDraft } from './spec-draft';
import { SpecRows } from './SpecRows';

const LABELS = {
  name: 'Name',
  propulsion: 'Propulsion',
  stroke: 'Stroke',
  engines: 'Engines',
  cylinders: 'Cylinders',
  carbCount: 'Carburettors',
};

/** Adds a model, or changes one; `mayWrite` false only shows it. */
export function ModelForm({ model, mayWrite }: { model: Model | null; mayWrite: boolean }) {
  const router = useRouter();
  const toast = useToast();
  const { busy, failure, run } = useSend();
  const [propulsion, setPropulsion] = useState<Model['propulsion']>(model?.propulsion ?? 'jet');
  const [rows, setRows] = useState<SpecDraft[]>(() => draftSpecs(model?.specs ?? {}));
  const [left, setLeft] = useState(false);

  async function submit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const engine = readEngine(event.currentTarget, propulsion, model !== null);
    const done = await run<Model>(async () => {
      const read = readSpecs(rows);
      if ('errors' in read) return refusedHere(read.errors);
      const body = { ...engine, specs: read.specs };
      return model
        ? send<Model>('PATCH', `/api/v1/models/${model.id}`, body)
        : send<Model>('POST', '/api/v1/models', body);
    });
    if (!done) return;
    setLeft(true);
    toast({ text: `${done.data.name} is saved.` });
    router.push('/models');
    router.refresh();
  }

  const shown = showSpecs(failure, rows);
  const error = (path: string) => fieldError(shown, path);
  return (
    <form noValidate className="grid max-w-4xl gap-8" onSubmit={(event) => void submit(event)}>
      <ErrorSummary
        errors={listErrors(shown, { ...LABELS, ...specLabels(rows) })}
        title="The model is not saved"
      />
      <Section title="Which model">
        <TextInput
          name="name"
          label="Name"
          maxLength={80}
          autoComplete="off"
          defaultValue={model?.name}
          disabled={!mayWrite}
          error={error('name')}
        />
      </Section>
      <Section
        title="What drives it"
        hint="Rules choose units by it. A change has every unit of the model assessed again; until then they are held."
      >
        <EngineFields
          model={model}
          propulsion={propulsion}
          onPropulsion={setPropulsion}
          disabled={!mayWrite}
          error={error}
        />
      </Section>
      <Section
        title="Specs"
        hint="What its measurements should be, from the engine maker’s manual: compression, plug gap and the like."
      >
        <SpecRows rows={rows} disabled={!mayWrite} error={error} onChange={setRows} />
      </Section>
      {mayWrite ? (
        <div className="flex flex-wrap gap-3 border-t-2 border-line pt-4">
          <Button type="submit" kind="primary" size="large" busy={busy || left}>
            {model ? 'Save' : 'Add the model'}
          </Button>
          <LinkButton kind="quiet" size="large" href="/models">
            Cancel
          </LinkButton>
        </div>
      ) : null}
    </form>
  );
}

/** What is hidden for an electric motor is nothing; a change takes the stroke away, a new model leaves it out. */
function readEngine(form: HTMLFormElement, propulsion: Model['propulsion'], changing: boolean) {
  const electric = propulsion === 'electric';
  return {
    name: textOf(form, 'name'),
    propulsion,
    stroke: electric ? (changing ? null : undefined) : textOf(form, 'stroke') || undefined,
    engines: numberOf(form, 'engines'),
    cylinders: electric ? 0 : numberOf(form, 'cylinders'),
    carbCount: electric ? 0 : numberOf(form, 'carbCount'),
  };
}
