'use client';

import { useToast } from '@/components/ui/Toast';
import { send } from '@/lib/client/api';
import type { CalendarDay } from '@/lib/domain/calendar-day';
import { describeDay } from '@/lib/domain/words';
import type { CalendarDuty } from '@/lib/schemas/calendar';

/**
 * Plans a duty on a day or on none: changes its task, or opens the rule's task where there is none yet. Says what
 * was done with a way back, or why not; `done` is called after either.
 */
export function usePlan(done: () => void) {
  const toast = useToast();
  async function put(taskId: string, plannedOn: CalendarDay | null): Promise<boolean> {
    const answer = await send('PATCH', `/api/v1/tasks/${taskId}`, { plannedOn });
    if (!answer.ok) toast({ text: `Not planned: ${answer.detail}` });
    done();
    return answer.ok;
  }
  async function openTask(duty: CalendarDuty, plannedOn: CalendarDay): Promise<string | null> {
    const body = { unitId: duty.unitId, ruleId: duty.ruleId, plannedOn };
    const answer = await send<{ id: string }>('POST', '/api/v1/tasks', body);
    if (!answer.ok) toast({ text: `Not planned: ${answer.detail}` });
    done();
    return answer.ok ? answer.data.id : null;
  }
  return async function plan(duty: CalendarDuty, plannedOn: CalendarDay | null): Promise<void> {
    const name = `${duty.title} on ${duty.fleetNumber}`;
    const taskId = duty.taskId
      ? (await put(duty.taskId, plannedOn)) && duty.taskId
      : plannedOn && (await openTask(duty, plannedOn));
    if (!taskId) return;
    const text = plannedOn
      ? `${name} is planned for ${describeDay(plannedOn)}.`
      : `${name} is planned on no day.`;
    toast({ text, undo: { run: () => void put(taskId, duty.plannedOn) } });
  };
}
