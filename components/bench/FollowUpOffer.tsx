'use client';

import Link from 'next/link';
import { useState } from 'react';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import type { Failure } from '@/lib/client/api';
import { entryId, forgetEntry } from '@/lib/client/entry-id';
import type { Step } from '@/lib/domain/procedure';
import type { PlaceState } from '@/lib/domain/step-states';
import { useSharedWork } from './WorkProvider';

const STATES = { open: 'open', done: 'done', withdrawn: 'withdrawn' };

/** What a failed step calls for, offered where it failed; and what was opened from there. */
export function FollowUpOffer({
  step,
  place,
  onFail,
}: {
  step: Step;
  place: PlaceState;
  onFail: string | null;
}) {
  const { work, act, mayWork, waiting } = useSharedWork();
  const [busy, setBusy] = useState(false);
  const [failure, setFailure] = useState<Failure | null>(null);
  const opened = work.followUps.filter((one) => one.stepKey === step.key && one.place === place.place);
  const failed = place.last === 'fail' || place.outcome === 'fail';
  const answered = opened.some(({ state }) => state !== 'withdrawn');
  if (opened.length === 0 && !failed) return null;
  async function open(): Promise<void> {
    const what = `follow-up:${work.taskId}:${step.key}:${place.place}`;
    setBusy(true);
    const refusal = await act('POST', 'follow-ups', {
      id: entryId(what),
      stepKey: step.key,
      place: place.place,
    });
    setBusy(false);
    setFailure(refusal);
    if (!refusal || refusal.code === 'conflict') forgetEntry(what);
  }
  return (
    <div className="grid gap-2">
      {opened.map((one) => (
        <p key={one.defectId ?? one.taskId} className="border-l-4 border-line pl-3">
          Follow-up:{' '}
          {one.taskId ? (
            <Link className="link" href={`/tasks/${one.taskId}`}>
              {one.title}
            </Link>
          ) : (
            one.title
          )}
          , {STATES[one.state]}.
        </p>
      ))}
      {failed && !answered && mayWork ? (
        <div className="grid gap-1">
          <p>{onFail ?? 'If it cannot be put right now, open a follow-up. It holds the unit.'}</p>
          <div>
            <Button busy={busy} disabled={waiting.length > 0} onClick={() => void open()}>
              Open the follow-up
            </Button>
          </div>
        </div>
      ) : null}
      {failure ? <Notice tone="danger">{failure.detail}</Notice> : null}
    </div>
  );
}
