'use client';

import { useId } from 'react';
import { Button } from '@/components/ui/Button';
import { TextInput } from '@/components/ui/TextInput';
import { parseMeasured } from '@/lib/domain/measured-value';
import { toLimits } from '@/lib/domain/measurement';
import type { Stage, Step } from '@/lib/domain/procedure';
import type { PlaceState } from '@/lib/domain/step-states';
import { EntryTrail } from './EntryTrail';
import { useDraft } from './use-draft';
import { VerdictMark } from './VerdictMark';
import { useSharedWork } from './WorkProvider';

const STAGE_WORDS: Record<Stage, string> = { found: 'As found', left: 'As left' };
const MOST_RUNS = 12;

/** The runs of one measurement at one place and stage, with the verdict on them. A run is entered when its field is left. */
export function MeasureEntry({
  step,
  place,
  stage,
  name,
}: {
  step: Step;
  place: PlaceState;
  stage: Stage;
  name: string;
}) {
  const { enter, mayWork, ready, work } = useSharedWork();
  const id = useId();
  const { spec, unit } = step.measures!;
  const spot = { step, place: place.place, stage };
  const entered = place[stage]?.kind === 'measurement' ? place[stage].runs : [];
  const judgement = stage === 'found' ? place.foundJudgement : place.leftJudgement;
  const wanted = toLimits(work.specs[spec], unit)?.repeats ?? 1;
  const { draft, setDraft } = useDraft<string[]>(`bench:${work.taskId}:${step.key}:${place.place}:${stage}`);
  const typed =
    draft ?? entered.map((run) => (run.unit === unit ? run.typed : `${bare(run.typed)} ${run.unit}`));
  const fields = Array.from({ length: Math.max(wanted, typed.length) }, (_, index) => typed[index] ?? '');
  const faults = fields.map((text) => {
    const read = text.trim() === '' ? null : parseMeasured(text, unit);
    return read && 'fault' in read ? read.fault : undefined;
  });

  async function put(): Promise<void> {
    const runs = fields.map((text) => text.trim()).filter(Boolean);
    if (faults.some(Boolean) || draft === null) return;
    if (runs.join('|') === entered.map((run) => run.typed).join('|')) return setDraft(null);
    await enter(
      spot,
      runs.length === 0
        ? { kind: 'cleared' }
        : { kind: 'measurement', runs: runs.map((text) => ({ typed: text })) },
    );
    setDraft(null);
  }

  return (
    <fieldset className="grid gap-2" disabled={!mayWork || !ready}>
      <legend className="float-left mb-1 font-semibold">{STAGE_WORDS[stage]}</legend>
      <div className="flex flex-wrap items-start gap-2">
        {fields.map((text, index) => (
          <div key={index} className="w-30">
            <TextInput
              id={`${id}-${index}`}
              aria-label={[step.title, name, STAGE_WORDS[stage], fields.length > 1 && `run ${index + 1}`]
                .filter(Boolean)
                .join(', ')}
              label={`${fields.length > 1 ? `Run ${index + 1}` : 'Value'}${unit ? `, ${unit}` : ''}`}
              className="numerals"
              autoComplete="off"
              maxLength={40}
              value={text}
              error={faults[index]}
              onChange={(event) =>
                setDraft(fields.map((one, at) => (at === index ? event.target.value : one)))
              }
              onBlur={() => void put()}
              onKeyDown={(event) => {
                if (event.key === 'Enter') void put();
              }}
            />
          </div>
        ))}
        {mayWork && fields.length < MOST_RUNS && fields.every((text) => text.trim() !== '') ? (
          <Button kind="quiet" className="self-end" onClick={() => setDraft([...fields, ''])}>
            Another run
          </Button>
        ) : null}
      </div>
      {judgement ? <VerdictMark judgement={judgement} /> : null}
      <EntryTrail spot={spot} />
    </fieldset>
  );
}

/** What was typed without a unit of measure behind it. */
const bare = (typed: string) => typed.replace(/[^\d\s./,¼½¾⅛⅜⅝⅞⅓⅔−-]+$/u, '').trim();
