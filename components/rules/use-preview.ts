'use client';

import { useEffect, useState } from 'react';
import { send } from '@/lib/client/api';
import type { ClosingShape } from '@/lib/schemas/closing';
import type { RulePreview, ScheduleShape } from '@/lib/schemas/rule';

/** The unit that due points are shown for, and today at its dock. */
export type PreviewUnit = {
  id: string;
  enteredServiceOn: string;
  engineHours: number;
  outings: number;
  today: string;
};

export type Preview =
  | { status: 'none' }
  | { status: 'loading' }
  | { status: 'failed'; detail: string }
  | { status: 'shown'; preview: RulePreview };

const DEBOUNCE_MS = 250;
const FURTHER_POINTS = 4;

/**
 * The next due points of a schedule for a unit, asked of the server a quarter of a second after the last change.
 * Only the answer to the last question is shown. `ruleId` brings in what was done under that rule.
 */
export function usePreview(
  schedule: ScheduleShape | null,
  unit: PreviewUnit | null,
  ruleId: string | null,
): Preview {
  const [answered, setAnswered] = useState<{ question: string; preview: Preview } | null>(null);
  const question =
    schedule && unit
      ? JSON.stringify({
          triggers: schedule.triggers,
          lead: schedule.lead,
          window: schedule.window,
          unit,
          ruleId,
        })
      : null;
  useEffect(() => {
    if (!question) return;
    let wanted = true;
    const timer = setTimeout(() => {
      void ask(question).then((preview) => {
        if (wanted) setAnswered({ question, preview });
      });
    }, DEBOUNCE_MS);
    return () => {
      wanted = false;
      clearTimeout(timer);
    };
  }, [question]);
  if (!question) return { status: 'none' };
  return answered?.question === question ? answered.preview : { status: 'loading' };
}

async function ask(question: string): Promise<Preview> {
  const { unit, ruleId, ...schedule } = JSON.parse(question) as ScheduleShape & {
    unit: PreviewUnit;
    ruleId: string | null;
  };
  const closings = ruleId
    ? await send<{ items: ClosingShape[] }>('GET', `/api/v1/units/${unit.id}/closings?ruleId=${ruleId}`)
    : { ok: true as const, data: { items: [] } };
  if (!closings.ok) return { status: 'failed', detail: closings.detail };
  const { enteredServiceOn, engineHours, outings, today } = unit;
  const answer = await send<RulePreview>('POST', '/api/v1/rules/preview', {
    ...schedule,
    unit: { enteredServiceOn, engineHours, outings },
    closings: closings.data.items,
    today,
    count: FURTHER_POINTS,
  });
  return answer.ok ? { status: 'shown', preview: answer.data } : { status: 'failed', detail: answer.detail };
}
