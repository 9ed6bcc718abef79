'use client';

import { useRouter } from 'next/navigation';
import { useState, type FormEvent } from 'react';
import { Button } from '@/components/ui/Button';
import { ErrorSummary } from '@/components/ui/ErrorSummary';
import { NumberInput } from '@/components/ui/NumberInput';
import { Textarea } from '@/components/ui/Textarea';
import { useToast } from '@/components/ui/Toast';
import { fieldError, send, type Failure } from '@/lib/client/api';
import { useSend } from '@/lib/client/use-send';
import { localInstant } from '@/lib/domain/local-instant';
import { parseHoursToTenths } from '@/lib/domain/meter';
import { toHours } from '@/lib/schemas/schedule-shape';
import type { PartLine } from '@/lib/schemas/part';
import type { Closure, TaskPage } from '@/lib/schemas/task';
import type { TaskParts } from '@/lib/schemas/task-parts';
import { PartsUsed } from './PartsUsed';
import { usePartsUsed } from './use-parts-used';
import { WhenFields, type When } from './WhenFields';

type Closing = Pick<TaskPage, 'id' | 'title' | 'fleetNumber' | 'engineHours' | 'timeZone' | 'today'>;

/** Records that a task was done. Hours are those of the live meter, parts those it needs, unless others are said. */
export function CloseForm({
  task,
  taskParts,
  parts,
}: {
  task: Closing;
  taskParts: TaskParts;
  parts: PartLine[];
}) {
  const used = usePartsUsed(taskParts, parts);
  const { busy, failure, run } = useSend();
  const live = task.engineHours.toFixed(1);
  const [done, setDone] = useState<When>({ when: 'now', day: task.today, time: '12:00' });
  const [hours, setHours] = useState(live);
  const [minutes, setMinutes] = useState('');
  const [note, setNote] = useState('');
  const [unread, setUnread] = useState<string | null>(null);
  const router = useRouter();
  const toast = useToast();

  async function submit(event: FormEvent): Promise<void> {
    event.preventDefault();
    const parsed = hours.trim() === '' ? null : parseHoursToTenths(hours);
    setUnread(parsed && !parsed.ok ? parsed.reason : null);
    if (parsed && !parsed.ok) return;
    const { day, time } = done;
    const earlier = done.when === 'earlier';
    const body = {
      ...(earlier && day && time && { at: instantOf(day, time, task.timeZone) }),
      ...(parsed?.ok && (earlier || hours !== live) && { engineHours: toHours(parsed.tenths) }),
      ...(minutes.trim() && { minutes: Number(minutes) }),
      ...(note.trim() && { note }),
      ...(used.sent.length > 0 && { partsUsed: used.sent }),
    };
    const closed = await run(() => send<Closure>('POST', `/api/v1/tasks/${task.id}/closure`, body));
    if (!closed) return router.refresh();
    toast({
      text: `${task.title} on ${task.fleetNumber} is closed at ${closed.data.engineHours.toFixed(1)} h.`,
    });
    router.refresh();
  }

  return (
    <form onSubmit={(event) => void submit(event)} noValidate className="grid gap-5">
      <ErrorSummary errors={listErrors(unread, failure)} title="The task is not closed yet" />
      <WhenFields
        value={done}
        today={task.today}
        error={fieldError(failure, 'at')}
        onChange={(next) => {
          if (next.when !== done.when) setHours(next.when === 'now' ? live : '');
          setDone(next);
        }}
      />
      <NumberInput
        name="engineHours"
        label="Engine hours"
        suffix="h"
        large
        hint={
          done.when === 'now'
            ? `The meter stands at ${live} h.`
            : 'Leave empty to take what the meter showed then.'
        }
        value={hours}
        error={unread ?? fieldError(failure, 'engineHours')}
        onChange={(event) => setHours(event.target.value)}
      />
      <NumberInput
        name="minutes"
        label="Time worked"
        suffix="min"
        whole
        optional
        value={minutes}
        error={fieldError(failure, 'minutes')}
        onChange={(event) => setMinutes(event.target.value)}
      />
      <PartsUsed
        used={used}
        parts={parts}
        dockName={taskParts.dockName}
        errorOf={(path) => fieldError(failure, path)}
      />
      <Textarea
        name="note"
        label="What was found and done"
        rows={3}
        optional
        value={note}
        error={fieldError(failure, 'note')}
        onChange={(event) => setNote(event.target.value)}
      />
      <Button type="submit" kind="primary" size="large" busy={busy}>
        Close task
      </Button>
    </form>
  );
}

/** What stands above the form: a field's error links to it, another's does not. */
function listErrors(unread: string | null, failure: Failure | null) {
  const refused = failure?.errors.length
    ? failure.errors
    : failure
      ? [{ path: '', message: failure.detail }]
      : [];
  return [...(unread ? [{ path: 'engineHours', message: unread }] : []), ...refused].map(
    ({ path, message }) => ({ path: isField(path) ? path : '', message }),
  );
}

const FIELDS = ['at', 'engineHours', 'minutes', 'note'];
const isField = (path: string) => FIELDS.includes(path) || path.startsWith('partsUsed.');

/** '2026-06-05' and '14:30' at the dock as an instant. */
function instantOf(day: string, time: string, timeZone: string): string {
  const [hours = 0, minutes = 0] = time.split(':').map(Number);
  return localInstant(day, hours * 60 + minutes, timeZone).toISOString();
}
