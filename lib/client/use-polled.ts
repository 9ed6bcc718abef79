'use client';

import { useCallback, useEffect, useRef, useState } from 'react';
import { send, type Failure } from './api';

/**
 * What a path of the API answers, asked again every `everyMs` while the page is seen and `paused` is not set. The
 * same answer is the same object, as `keyOf` tells; a failure keeps the last answer. `ask` asks at once.
 */
export function usePolled<T>(
  path: string,
  {
    everyMs,
    initial,
    keyOf,
    paused = false,
  }: { everyMs: number; initial: T; keyOf: (data: T) => string; paused?: boolean },
): { data: T; failure: Failure | null; ask: () => Promise<void> } {
  const [data, setData] = useState(initial);
  const [failure, setFailure] = useState<Failure | null>(null);
  const known = useRef(keyOf(initial));
  const current = useRef(path);
  useEffect(() => {
    current.current = path;
  }, [path]);

  const ask = useCallback(async () => {
    const answer = await send<T>('GET', path);
    if (current.current !== path) return;
    setFailure(answer.ok ? null : answer);
    if (!answer.ok) return;
    const key = keyOf(answer.data);
    if (key === known.current) return;
    known.current = key;
    setData(answer.data);
  }, [path, keyOf]);

  useEffect(() => {
    if (paused) return;
    let stopped = false;
    let timer: ReturnType<typeof setTimeout> | undefined;
    const round = async () => {
      if (!document.hidden) await ask();
      if (!stopped) timer = setTimeout(() => void round(), everyMs);
    };
    void round();
    const seen = () => void (document.hidden || ask());
    document.addEventListener('visibilitychange', seen);
    return () => {
      stopped = true;
      clearTimeout(timer);
      document.removeEventListener('visibilitychange', seen);
    };
  }, [ask, everyMs, paused]);

  return { data, failure, ask };
}
