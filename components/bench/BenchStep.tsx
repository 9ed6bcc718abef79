import Link from 'next/link';
import {
  describeOnFail,
  describeRetest,
  describeWhen,
  stepKindWords,
} from '@/components/procedures/step-words';
import { Notice } from '@/components/ui/Notice';
import { describePlace } from '@/lib/domain/closing-check';
import { describeLimits, toLimits } from '@/lib/domain/measurement';
import type { PlaceState, StepState } from '@/lib/domain/step-states';
import { CheckEntry } from './CheckEntry';
import { FollowUpOffer } from './FollowUpOffer';
import { MeasureEntry } from './MeasureEntry';
import { NoteEntry } from './NoteEntry';
import { PhotoEntry } from './PhotoEntry';
import { useSharedWork } from './WorkProvider';

/** Names a place of a step on the page, so that what is missing can lead to it. */
export const spotId = (stepKey: string, place: number) => `step-${stepKey}-${place}`;

/** One step with all its places. A caution stands alone; what a step waits for is said at the place that waits. */
export function BenchStep({ state, number }: { state: StepState; number: number }) {
  const { step, places } = state;
  const { work } = useSharedWork();
  if (step.kind === 'caution')
    return (
      <li className="border-t border-hairline py-4">
        <Notice tone="warn" title={step.title} still>
          {step.detail}
        </Notice>
      </li>
    );
  const idle = places.every(({ applies }) => applies === 'no');
  const limits = step.measures && toLimits(work.specs[step.measures.spec], step.measures.unit);
  const facts = [
    stepKindWords[step.kind],
    limits ? describeLimits(limits) : null,
    step.required ? null : 'if wanted',
  ].filter((fact) => fact !== null);
  return (
    <li className="grid break-inside-avoid gap-3 border-t border-hairline py-5">
      <div className="grid grid-cols-[2.5rem_minmax(0,1fr)] gap-x-3">
        <span className="numerals text-xl font-bold text-line">{number}</span>
        <div className="grid gap-1.5">
          <h3 className="text-lg">{step.title}</h3>
          <p className="text-ink-soft">
            {facts.join(' · ')}
            {step.measures ? (
              <>
                {' · '}
                <Link className="link" href={`/units/${work.unitId}#measurements`}>
                  measured so far
                </Link>
              </>
            ) : null}
          </p>
          {idle ? null : (
            <>
              {step.detail ? <p className="max-w-prose">{step.detail}</p> : null}
              <Retest step={step} steps={work.steps} />
              {step.caution ? (
                <Notice tone="warn" still>
                  {step.caution}
                </Notice>
              ) : null}
            </>
          )}
        </div>
      </div>
      <div className="grid gap-3 sm:grid-cols-[repeat(auto-fit,minmax(15rem,1fr))] sm:pl-13">
        {places.map((place) => (
          <Place key={place.place} state={state} place={place} />
        ))}
        {places.length === 0 ? <p className="text-ink-soft">This unit has none.</p> : null}
      </div>
    </li>
  );
}

function Retest({ step, steps }: { step: StepState['step']; steps: readonly StepState['step'][] }) {
  const words = describeRetest(step, steps);
  return words ? <p className="font-semibold">{words}</p> : null;
}

function Place({ state: { step, places }, place }: { state: StepState; place: PlaceState }) {
  const { work } = useSharedWork();
  const name = describePlace(step.per, place.place);
  const alone = places.length === 1 && place.place === 0;
  const when = describeWhen(step, work.steps);
  return (
    <div
      id={spotId(step.key, place.place)}
      role="group"
      tabIndex={-1}
      aria-label={name || step.title}
      className={
        alone ? 'grid content-start gap-2' : 'grid content-start gap-2 border-t-2 border-edge bg-raised p-3'
      }
    >
      {name ? <h4 className="font-semibold first-letter:uppercase">{name}</h4> : null}
      {place.applies === 'yes' ? (
        <>
          <Entry step={step} place={place} name={name} />
          <FollowUpOffer step={step} place={place} onFail={describeOnFail(step)} />
        </>
      ) : (
        <p className="text-ink-soft">
          {place.applies === 'waits' ? `Waits. ${when ?? ''}` : `Leave alone. ${when ?? ''}`}
        </p>
      )}
    </div>
  );
}

function Entry({ step, place, name }: { step: StepState['step']; place: PlaceState; name: string }) {
  if (step.kind === 'check') return <CheckEntry step={step} place={place} name={name} />;
  if (step.kind === 'note') return <NoteEntry step={step} place={place} name={name} />;
  if (step.kind === 'photo') return <PhotoEntry step={step} place={place} />;
  if (!step.measures) return null;
  return (
    <div className="grid gap-4">
      {step.measures.stages.map((stage) => (
        <MeasureEntry key={stage} step={step} place={place} stage={stage} name={name} />
      ))}
    </div>
  );
}
