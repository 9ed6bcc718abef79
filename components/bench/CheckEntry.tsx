'use client';

import { useState } from 'react';
import { Button } from '@/components/ui/Button';
import { cx } from '@/components/ui/cx';
import { TextInput } from '@/components/ui/TextInput';
import type { Step } from '@/lib/domain/procedure';
import type { PlaceState } from '@/lib/domain/step-states';
import { EntryTrail } from './EntryTrail';
import { useSharedWork } from './WorkProvider';

type Outcome = 'pass' | 'fail' | 'not_applicable';
const CHOICES: { outcome: Outcome; label: string; mark: string; chosen: string }[] = [
  { outcome: 'pass', label: 'Pass', mark: '✓', chosen: 'border-ok bg-ok-tint text-ok' },
  { outcome: 'fail', label: 'Fail', mark: '✗', chosen: 'border-danger bg-danger-tint text-danger' },
  {
    outcome: 'not_applicable',
    label: 'Does not apply',
    mark: '–',
    chosen: 'border-info bg-info-tint text-info',
  },
];

/** Passes, fails or does not apply: one tap. What was wrong can be said with it. */
export function CheckEntry({ step, place, name }: { step: Step; place: PlaceState; name: string }) {
  const { enter, mayWork, ready } = useSharedWork();
  const spot = { step, place: place.place, stage: null };
  const value = place.entry?.kind === 'check' ? place.entry : null;
  const [note, setNote] = useState<string | null>(null);
  const said = note ?? value?.note ?? '';
  const put = (outcome: Outcome, words: string) =>
    void enter(spot, { kind: 'check', outcome, ...(words.trim() && { note: words.trim() }) });
  return (
    <div className="grid gap-2">
      <div
        role="group"
        aria-label={[step.title, name].filter(Boolean).join(', ')}
        className="flex flex-wrap gap-2"
      >
        {CHOICES.map(({ outcome, label, mark, chosen }) => {
          const pressed = value?.outcome === outcome;
          return (
            <button
              key={outcome}
              type="button"
              aria-pressed={pressed}
              disabled={!mayWork || !ready}
              onClick={() => {
                if (!pressed) put(outcome, outcome === 'pass' ? '' : said);
                if (outcome === 'pass') setNote(null);
              }}
              className={cx(
                'inline-flex min-h-dock items-center gap-2 rounded border-2 px-4 font-semibold disabled:cursor-not-allowed',
                pressed ? chosen : 'border-edge bg-raised text-ink enabled:hover:bg-shoal',
              )}
            >
              <span aria-hidden="true" className={pressed ? '' : 'text-ink-soft'}>
                {mark}
              </span>
              {label}
            </button>
          );
        })}
      </div>
      {value && value.outcome !== 'pass' && mayWork ? (
        <TextInput
          label={value.outcome === 'fail' ? 'What is wrong' : 'Why not'}
          optional
          maxLength={500}
          value={said}
          onChange={(event) => setNote(event.target.value)}
          onBlur={() => {
            if (said.trim() !== (value.note ?? '')) put(value.outcome, said);
          }}
        />
      ) : value?.note ? (
        <p>{value.note}</p>
      ) : null}
      <EntryTrail spot={spot}>
        {value && mayWork ? (
          <Button kind="quiet" onClick={() => void enter(spot, { kind: 'cleared' })}>
            Take back
          </Button>
        ) : null}
      </EntryTrail>
    </div>
  );
}
