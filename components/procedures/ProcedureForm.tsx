'use client';

import { useRouter } from 'next/navigation';
import { useId, useState, type FormEvent } from 'react';
import { useUnsavedWarning } from '@/components/rules/use-unsaved-warning';
import { Button } from '@/components/ui/Button';
import { ErrorSummary } from '@/components/ui/ErrorSummary';
import { Notice } from '@/components/ui/Notice';
import { useToast } from '@/components/ui/Toast';
import { fieldError, send, type Failure } from '@/lib/client/api';
import { listErrors } from '@/lib/client/list-errors';
import { useSend } from '@/lib/client/use-send';
import type { Procedure, ProcedureFormData } from '@/lib/schemas/procedure';
import { draftSteps, moveStep, newStep, toSteps, type StepDraft } from './procedure-draft';
import { ProcedureName } from './ProcedureName';
import { StepFields } from './StepFields';

const LABELS: Record<string, string> = { name: 'Name', note: 'What is new', steps: 'Steps' };

/** A field of a step goes by the step's number. */
function labelsOf(failure: Failure | null): Record<string, string> {
  const paths = (failure?.errors ?? []).map(({ path }) => path);
  const ofSteps = paths.flatMap((path) => {
    const index = /^steps\.(\d+)/.exec(path)?.[1];
    return index === undefined ? [] : [[path, `Step ${Number(index) + 1}`]];
  });
  return { ...LABELS, ...Object.fromEntries(ofSteps) };
}

/** Writes a procedure, or the next version of one. */
export function ProcedureForm({ procedure, specNames }: ProcedureFormData) {
  const router = useRouter();
  const toast = useToast();
  const { busy, failure, run } = useSend();
  const specsId = useId();
  const [name, setName] = useState(procedure?.name ?? '');
  const [kind, setKind] = useState<Procedure['kind']>(procedure?.kind ?? 'inspection');
  const [note, setNote] = useState('');
  const [steps, setSteps] = useState<StepDraft[]>(() => draftSteps(procedure?.steps ?? []));
  const [changed, setChanged] = useState(false);
  useUnsavedWarning(changed);
  const error = (path: string) => fieldError(failure, path);

  function change(next: StepDraft[]): void {
    setSteps(next);
    setChanged(true);
  }
  async function submit(event: FormEvent<HTMLFormElement>): Promise<void> {
    event.preventDefault();
    const body = { name, kind, steps: toSteps(steps), ...(note.trim() && { note }) };
    const done = await run<Procedure>(() =>
      procedure
        ? send('PUT', `/api/v1/procedures/${procedure.id}`, { ...body, version: procedure.version })
        : send('POST', '/api/v1/procedures', body),
    );
    if (!done) return;
    setChanged(false);
    toast({ text: `${done.data.name} is saved as version ${done.data.version}.` });
    router.push(`/procedures/${done.data.id}`);
    router.refresh();
  }

  return (
    <form noValidate className="grid max-w-3xl gap-8" onSubmit={(event) => void submit(event)}>
      <ErrorSummary errors={listErrors(failure, labelsOf(failure))} title="The procedure is not saved" />
      <Notice tone="warn" still>
        The engine maker’s manual, local law and licensed practice come first. Put each caution at the step it
        belongs to.
      </Notice>
      <ProcedureName
        name={name}
        kind={kind}
        note={procedure ? note : null}
        error={error}
        onChange={(part) => {
          if (part.name !== undefined) setName(part.name);
          if (part.kind !== undefined) setKind(part.kind);
          if (part.note !== undefined) setNote(part.note);
          setChanged(true);
        }}
      />
      <datalist id={specsId}>
        {specNames.map((spec) => (
          <option key={spec} value={spec} />
        ))}
      </datalist>
      <div id="steps" className="grid gap-8">
        {steps.map((step, index) => (
          <StepFields
            key={step.row}
            step={step}
            index={index}
            earlier={steps.slice(0, index)}
            last={index === steps.length - 1}
            specsId={specsId}
            error={error}
            onChange={(part) =>
              change(steps.map((one) => (one.row === step.row ? { ...one, ...part } : one)))
            }
            onMove={(by) => change(moveStep(steps, index, by))}
            onRemove={() => change(steps.filter(({ row }) => row !== step.row))}
          />
        ))}
        <div className="border-t-2 border-line pt-4">
          <Button
            onClick={() => change([...steps, newStep(Math.max(-1, ...steps.map(({ row }) => row)) + 1)])}
          >
            Add a step
          </Button>
        </div>
      </div>
      <div className="border-t-2 border-line pt-4">
        <Button type="submit" kind="primary" size="large" busy={busy}>
          Save the procedure
        </Button>
      </div>
    </form>
  );
}
