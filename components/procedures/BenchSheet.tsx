import { Notice } from '@/components/ui/Notice';
import type { Step } from '@/lib/domain/procedure';
import {
  describeMeasures,
  describeOnFail,
  describeRetest,
  describeWhen,
  perWords,
  stepKindWords,
} from './step-words';

/** A procedure as it lies on the bench: its steps in order, each caution at the step it belongs to. */
export function BenchSheet({ steps }: { steps: readonly Step[] }) {
  return (
    <ol className="grid">
      {steps.map((step, index) => (
        <li
          key={step.key}
          className="grid break-inside-avoid grid-cols-[2.5rem_minmax(0,1fr)] gap-x-3 border-t border-hairline py-4"
        >
          <span className="numerals text-xl font-bold text-line">{index + 1}</span>
          <div className="grid gap-1.5">
            {step.kind === 'caution' ? (
              <Notice tone="warn" title={step.title} still>
                {step.detail}
              </Notice>
            ) : (
              <StepText step={step} steps={steps} />
            )}
          </div>
        </li>
      ))}
    </ol>
  );
}

function StepText({ step, steps }: { step: Step; steps: readonly Step[] }) {
  const facts = [
    stepKindWords[step.kind],
    step.measures ? describeMeasures(step.measures) : null,
    perWords[step.per],
    step.required ? null : 'if wanted',
  ].filter((fact) => fact !== null);
  const when = describeWhen(step, steps);
  const retest = describeRetest(step, steps);
  const onFail = describeOnFail(step);
  return (
    <>
      <h3 className="text-lg">{step.title}</h3>
      <p className="text-ink-soft">{facts.join(' · ')}</p>
      {when ? <p className="font-semibold">{when}</p> : null}
      {retest ? <p className="font-semibold">{retest}</p> : null}
      {step.detail ? <p className="max-w-prose">{step.detail}</p> : null}
      {step.caution ? (
        <Notice tone="warn" still>
          {step.caution}
        </Notice>
      ) : null}
      {onFail ? <p className="text-ink-soft">{onFail}</p> : null}
    </>
  );
}
