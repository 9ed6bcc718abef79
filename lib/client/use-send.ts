'use client';

import { useState } from 'react';
import type { Answer, Failure } from './api';

/**
 * One thing that is being sent from a form: whether it is on its way, and why it failed last time. `run` answers
 * what came back, or null when it failed.
 */
export function useSend() {
  const [busy, setBusy] = useState(false);
  const [failure, setFailure] = useState<Failure | null>(null);
  async function run<T>(work: () => Promise<Answer<T>>): Promise<{ data: T } | null> {
    setBusy(true);
    setFailure(null);
    const answer = await work();
    setBusy(false);
    if (answer.ok) return { data: answer.data };
    setFailure(answer);
    return null;
  }
  return { busy, failure, run, forget: () => setFailure(null) };
}
