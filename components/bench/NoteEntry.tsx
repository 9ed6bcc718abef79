'use client';

import { Button } from '@/components/ui/Button';
import { Textarea } from '@/components/ui/Textarea';
import type { Step } from '@/lib/domain/procedure';
import type { PlaceState } from '@/lib/domain/step-states';
import { EntryTrail } from './EntryTrail';
import { useDraft } from './use-draft';
import { useSharedWork } from './WorkProvider';

/** Words for the record. They are entered when the field is left. */
export function NoteEntry({ step, place, name }: { step: Step; place: PlaceState; name: string }) {
  const { enter, mayWork, ready, work } = useSharedWork();
  const spot = { step, place: place.place, stage: null };
  const entered = place.entry?.kind === 'note' ? place.entry.text : '';
  const { draft, setDraft } = useDraft<string>(`bench:${work.taskId}:${step.key}:${place.place}`);
  const text = draft ?? entered;
  async function put(): Promise<void> {
    const words = text.trim();
    if (words === entered) return setDraft(null);
    await enter(spot, words === '' ? { kind: 'cleared' } : { kind: 'note', text: words });
    setDraft(null);
  }
  if (!mayWork) return <p className="whitespace-pre-line">{entered || 'Nothing written.'}</p>;
  return (
    <div className="grid gap-2">
      <Textarea
        label={name ? `Note, ${name}` : 'Note'}
        rows={2}
        maxLength={4000}
        value={text}
        disabled={!ready}
        onChange={(event) => setDraft(event.target.value)}
        onBlur={() => void put()}
      />
      {draft !== null && draft.trim() !== entered ? (
        <div>
          <Button onClick={() => void put()}>Save the note</Button>
        </div>
      ) : null}
      <EntryTrail spot={spot} />
    </div>
  );
}
