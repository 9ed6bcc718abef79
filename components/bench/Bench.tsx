'use client';

import { countDone } from '@/lib/domain/step-states';
import { BenchStep } from './BenchStep';
import { SaveState } from './SaveState';
import { useSharedWork } from './WorkProvider';

/** The steps of a task in their order, each with its places side by side, and how far the work is. */
export function Bench() {
  const { work, states, me, mayWork } = useSharedWork();
  const { done, of } = countDone(states);
  const others = work.present.filter(({ id }) => id !== me.id);
  return (
    <div className="grid gap-4">
      <div className="no-print sticky top-0 z-20 grid gap-2 border-b-2 border-line bg-paper py-3">
        <div className="flex flex-wrap items-center justify-between gap-x-6 gap-y-1">
          <p className="font-semibold">
            <span className="numerals">
              {done} of {of}
            </span>{' '}
            required results
          </p>
          {mayWork ? <SaveState /> : null}
        </div>
        <div
          role="progressbar"
          aria-label="Required results"
          aria-valuemin={0}
          aria-valuemax={of}
          aria-valuenow={done}
          className="h-2 w-full border border-edge"
        >
          <div className="h-full bg-act" style={{ width: `${of === 0 ? 0 : (100 * done) / of}%` }} />
        </div>
        {others.length > 0 ? (
          <p role="status" className="font-semibold text-info">
            At this task too: {others.map(({ name }) => name).join(', ')}. What they enter shows here.
          </p>
        ) : null}
      </div>
      <ol className="grid">
        {states.map((state, index) => (
          <BenchStep key={state.step.key} state={state} number={index + 1} />
        ))}
      </ol>
    </div>
  );
}
