'use client';

import { useCallback, useEffect, useMemo, useState } from 'react';
import { send, type Failure } from '@/lib/client/api';
import { makeId } from '@/lib/client/entry-id';
import { discardEntry, keepEntry, type KeptEntry, type SentEntry } from '@/lib/client/outbox';
import { useOutbox } from '@/lib/client/use-outbox';
import { usePolled } from '@/lib/client/use-polled';
import { checkClosing, type ClosingFault } from '@/lib/domain/closing-check';
import { computeSteps, type StepState } from '@/lib/domain/step-states';
import type { Entry, EntryInput, RecordedEntry, Work } from '@/lib/schemas/work';
import { entriesAt, joinEntries, type BenchEntry, type Spot } from './bench-entries';

const LOOK_MS = 2500;
const PRESENT_MS = 20_000;
const keyOf = (work: Work) => JSON.stringify(work);

/** What somebody else entered at a spot while one's own entry was on its way. */
export type Overtaken = { id: string; overtook: NonNullable<RecordedEntry['overtook']> };

export type BenchWork = {
  work: Work;
  states: StepState[];
  entries: BenchEntry[];
  /** All that this device has for the task: what is not sent yet, and what was refused. */
  kept: KeptEntry[];
  waiting: KeptEntry[];
  refused: KeptEntry[];
  overtaken: Overtaken[];
  faults: ClosingFault[];
  /** Whether the server answered when it was last asked. */
  reached: boolean;
  /** What is on this device is known: until then nothing is entered. */
  ready: boolean;
  enter: (spot: Spot, value: EntryInput) => Promise<void>;
  /** Sends to a path below the task; answers why it failed, or null. */
  act: (method: 'POST' | 'DELETE', path: string, body?: object) => Promise<Failure | null>;
  discard: (entry: KeptEntry) => void;
  sendNow: () => void;
};

/** A task at the bench as it stands here: what the server has, and what this device has for it. */
export function useWork(initial: Work, me: { id: string; name: string }, mayWork: boolean): BenchWork {
  const path = `/api/v1/tasks/${initial.taskId}`;
  const { data: work, failure, ask } = usePolled<Work>(`${path}/work`, { everyMs: LOOK_MS, initial, keyOf });
  const { arrived, overtaken, sent } = useArrivals(ask);
  const { kept, ready, drain } = useOutbox(`task:${initial.taskId}`, me.id, sent);
  usePresence(`${path}/presence`, mayWork && work.endedAt === null);

  const entries = useMemo(() => {
    const known = new Set(work.entries.map(({ id }) => id));
    const all = [...work.entries, ...arrived.filter(({ id }) => !known.has(id))];
    return joinEntries(all, kept, work.steps, me);
  }, [work, arrived, kept, me]);
  const states = useMemo(() => computeSteps({ ...work, entries }), [work, entries]);
  const faults = useMemo(() => findFaults(work, states, me.id), [work, states, me.id]);

  const enter = useCallback(
    async ({ step, place, stage }: Spot, value: EntryInput) => {
      const stood = entriesAt(entries, { step, place, stage }).at(-1);
      const id = makeId();
      const madeAt = new Date().toISOString();
      const body = {
        id,
        stepKey: step.key,
        place,
        ...(stage && { stage }),
        value,
        followsId: stood?.id ?? null,
      };
      await keepEntry({
        ...{ id, madeAt, owner: me.id, scope: `task:${initial.taskId}` },
        path: `${path}/entries`,
        body,
      });
      drain();
    },
    [entries, me.id, initial.taskId, path, drain],
  );
  const act = useCallback(
    async (method: 'POST' | 'DELETE', below: string, body?: object) => {
      const answer = await send(method, `${path}/${below}`, body);
      await ask();
      return answer.ok ? null : answer;
    },
    [path, ask],
  );
  return {
    ...{ work, states, entries, overtaken, faults, kept, ready, enter, act },
    waiting: kept.filter(({ refused }) => refused === null),
    refused: kept.filter(({ refused }) => refused !== null),
    reached: failure === null,
    discard: ({ order }) => void discardEntry(order),
    sendNow: drain,
  };
}

/** What the server took of this device's entries, until the next look at the task shows it. */
function useArrivals(ask: () => Promise<void>) {
  const [overtaken, setOvertaken] = useState<Overtaken[]>([]);
  const [arrived, setArrived] = useState<Entry[]>([]);
  const sent = useCallback(
    ({ entry: { id }, isFile, answer }: SentEntry) => {
      if (isFile) return;
      const { entry, overtook } = answer as RecordedEntry;
      setArrived((list) => [...list, entry]);
      if (overtook) setOvertaken((list) => [...list, { id, overtook }]);
      void ask();
    },
    [ask],
  );
  return { arrived, overtaken, sent };
}

function findFaults(work: Work, states: StepState[], closerId: string): ClosingFault[] {
  const signOffs = work.signOffs.map(({ kind, signedBy, stands }) => ({
    kind,
    stands,
    personId: signedBy.id,
  }));
  const { holdsUnit, followUps, wants } = work;
  return checkClosing({ states, holdsUnit, followUps, signOffs, wants, closerId });
}

/** Says that one is at the task, for as long as the page is looked at. */
function usePresence(path: string, here: boolean): void {
  useEffect(() => {
    if (!here) return;
    const say = () => {
      if (!document.hidden) void send('POST', path);
    };
    say();
    const timer = setInterval(say, PRESENT_MS);
    return () => clearInterval(timer);
  }, [path, here]);
}
