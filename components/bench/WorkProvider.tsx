'use client';

import { createContext, useContext, type ReactNode } from 'react';
import type { Work } from '@/lib/schemas/work';
import { useWork, type BenchWork } from './use-work';

type Shared = BenchWork & { mayWork: boolean; me: { id: string; name: string }; timeZone: string };

const WorkContext = createContext<Shared | null>(null);

/** Gives the parts of a task's page one view of the work: the bench, the signatures and the closing. */
export function WorkProvider({
  initial,
  me,
  mayWork,
  timeZone,
  children,
}: {
  initial: Work;
  me: { id: string; name: string };
  mayWork: boolean;
  timeZone: string;
  children: ReactNode;
}) {
  const shared = useWork(initial, me, mayWork);
  return <WorkContext value={{ ...shared, mayWork, me, timeZone }}>{children}</WorkContext>;
}

/** The work of the page's task. Throws outside its provider. */
export function useSharedWork(): Shared {
  const shared = useContext(WorkContext);
  if (!shared) throw new Error('There is no WorkProvider around this.');
  return shared;
}
