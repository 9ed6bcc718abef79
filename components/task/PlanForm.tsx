'use client';

import { useState } from 'react';
import { Button } from '@/components/ui/Button';
import { TextInput } from '@/components/ui/TextInput';
import { addDays } from '@/lib/domain/calendar-day';
import { describeDay } from '@/lib/domain/words';
import type { Task } from '@/lib/schemas/task';
import { useTaskChange } from './use-task-change';

/** Plans a task on a day or on none, with a way back. */
export function PlanForm({ task }: { task: Pick<Task, 'id' | 'plannedOn' | 'today'> }) {
  const { busy, change } = useTaskChange(task.id);
  const [day, setDay] = useState(task.plannedOn ?? '');
  async function plan(plannedOn: string | null): Promise<void> {
    if (plannedOn === task.plannedOn) return;
    const said = plannedOn ? `Planned for ${describeDay(plannedOn)}.` : 'Planned on no day.';
    if (await change({ plannedOn }, said, { plannedOn: task.plannedOn })) setDay(plannedOn ?? '');
  }
  return (
    <form
      className="grid gap-3"
      onSubmit={(event) => {
        event.preventDefault();
        if (day) void plan(day);
      }}
    >
      <div className="flex flex-wrap items-end gap-2">
        <TextInput
          type="date"
          label="Plan for"
          value={day}
          min={task.today}
          onChange={(event) => setDay(event.target.value)}
        />
        <Button type="submit" busy={busy} disabled={!day || day === task.plannedOn}>
          Plan
        </Button>
      </div>
      <div className="flex flex-wrap gap-2">
        <Button busy={busy} onClick={() => void plan(task.today)}>
          Today
        </Button>
        <Button busy={busy} onClick={() => void plan(addDays(task.today, 1))}>
          Tomorrow
        </Button>
        {task.plannedOn ? (
          <Button kind="quiet" busy={busy} onClick={() => void plan(null)}>
            Take the plan away
          </Button>
        ) : null}
      </div>
    </form>
  );
}
