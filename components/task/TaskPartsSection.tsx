'use client';

import Link from 'next/link';
import { useRouter } from 'next/navigation';
import { useState } from 'react';
import { partOptions } from '@/components/parts/part-words';
import { StockMark } from '@/components/parts/StockMark';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import { Select } from '@/components/ui/Select';
import { Stepper } from '@/components/ui/Stepper';
import { send } from '@/lib/client/api';
import { entryId, forgetEntry } from '@/lib/client/entry-id';
import { useSend } from '@/lib/client/use-send';
import type { PartLine } from '@/lib/schemas/part';
import type { TaskPart, TaskParts } from '@/lib/schemas/task-parts';

type Send = (method: 'POST' | 'PUT' | 'DELETE', path: string, body?: object) => Promise<boolean>;

/** What a task needs of parts, where they are, and setting them aside. `parts` are those that can be added. */
export function TaskPartsSection({
  task,
  parts,
  mayWork,
}: {
  task: TaskParts;
  parts: PartLine[];
  mayWork: boolean;
}) {
  const router = useRouter();
  const { busy, failure, run } = useSend();
  const api = `/api/v1/tasks/${task.taskId}`;
  const change: Send = async (method, path, body) => {
    const done = await run(() => send(method, path, body));
    router.refresh();
    return done !== null;
  };
  const canReserve = task.parts.some(({ needed, reserved, free }) => reserved < Math.min(needed, free));
  if (task.parts.length === 0 && !mayWork) return null;
  return (
    <section className="grid gap-3" aria-labelledby="parts">
      <h2 id="parts" className="text-2xl">
        Parts
      </h2>
      {failure ? <Notice tone="danger">{failure.detail}</Notice> : null}
      {task.parts.length === 0 ? <p className="text-ink-soft">None are asked for.</p> : null}
      <ul className="grid">
        {task.parts.map((part) => (
          <NeedLine key={part.partId} part={part} task={task} mayWork={mayWork} busy={busy} change={change} />
        ))}
      </ul>
      {mayWork ? (
        <div className="no-print grid gap-3">
          {canReserve ? (
            <div>
              <Button kind="primary" busy={busy} onClick={() => void change('POST', `${api}/reservations`)}>
                Set aside what is here
              </Button>
            </div>
          ) : null}
          <AddNeed
            parts={parts.filter(({ id }) => !task.parts.some(({ partId }) => partId === id))}
            busy={busy}
            onAdd={(partId) => change('PUT', `${api}/needs`, { partId, quantity: 1 })}
          />
        </div>
      ) : null}
    </section>
  );
}

function NeedLine({
  part,
  task,
  mayWork,
  busy,
  change,
}: {
  part: TaskPart;
  task: TaskParts;
  mayWork: boolean;
  busy: boolean;
  change: Send;
}) {
  const { partId, needed, reserved, short } = part;
  const api = `/api/v1/tasks/${task.taskId}`;
  const more = Math.min(Math.max(1, short), part.canMakeUp);
  const makeUp = async () => {
    const what = `make-up ${task.taskId} ${partId} ${part.onHand}`;
    const body = { id: entryId(what), kind: 'make_up', partId, dockId: task.dockId, quantity: more };
    if (await change('POST', '/api/v1/stock-moves', body)) forgetEntry(what);
  };
  return (
    <li className="grid gap-1 border-t border-hairline py-3">
      <div className="flex flex-wrap items-center justify-between gap-x-4">
        <span className="flex flex-wrap items-center gap-x-2">
          <span className="numerals font-bold">{needed} ×</span>
          <Link href={`/parts/${partId}`} className="link inline-flex min-h-target items-center font-bold">
            {part.name}
          </Link>
          <span className="numerals text-ink-soft">{part.number}</span>
        </span>
        <NeedMark part={part} />
      </div>
      <p className="text-ink-soft">
        <span className="numerals">{part.onHand}</span> on hand at {task.dockName}
        {part.elsewhere.map((dock) => (
          <span key={dock.dockId}>
            , <span className="numerals">{dock.free}</span> free at {dock.dockName}
          </span>
        ))}
        .
      </p>
      {mayWork ? (
        <div className="no-print flex flex-wrap items-center gap-x-6 gap-y-2">
          <Stepper
            label={`${part.name} needed`}
            value={needed}
            disabled={busy}
            onChange={(quantity) => void change('PUT', `${api}/needs`, { partId, quantity })}
          />
          {reserved > 0 ? (
            <Button
              busy={busy}
              aria-label={`Release ${part.name}`}
              onClick={() => void change('PUT', `${api}/reservations`, { partId, quantity: 0 })}
            >
              Release
            </Button>
          ) : null}
          {short > 0 && more > 0 ? (
            <Button busy={busy} onClick={() => void makeUp()}>
              Make up {more} here
            </Button>
          ) : null}
        </div>
      ) : null}
    </li>
  );
}

/** Whether a task has what it needs of a part: set aside, here but not yet, or short by so many. */
function NeedMark({ part: { needed, reserved, short } }: { part: TaskPart }) {
  if (short > 0) return <StockMark state="short" detail={`by ${short}`} />;
  if (reserved > 0)
    return <StockMark state="aside" detail={needed > 0 ? `${reserved} of ${needed}` : `${reserved}`} />;
  return <StockMark state="here" />;
}

function AddNeed({
  parts,
  busy,
  onAdd,
}: {
  parts: PartLine[];
  busy: boolean;
  onAdd: (partId: string) => Promise<boolean>;
}) {
  const [adding, setAdding] = useState('');
  if (parts.length === 0) return null;
  return (
    <div className="grid max-w-xl items-end gap-2 sm:grid-cols-[1fr_auto]">
      <Select
        label="It also needs"
        placeholder="Choose a part"
        options={partOptions(parts)}
        value={adding}
        onChange={(event) => setAdding(event.target.value)}
      />
      <Button
        disabled={!adding}
        busy={busy}
        onClick={() => void onAdd(adding).then((done) => (done ? setAdding('') : undefined))}
      >
        Add to the task
      </Button>
    </div>
  );
}
