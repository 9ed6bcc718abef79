'use client';

import { useCallback, useEffect, useRef, useState } from 'react';
import { drainOutbox, listKept, onOutboxChange, type KeptEntry } from './outbox';

/** How soon what could not be sent is tried again, while the page is open. */
const AGAIN_MS = 4000;

/**
 * What a person entered for `scope` that the server does not have yet. It is sent at once, when the network comes
 * back, when the page is looked at again and every few seconds; `drain` sends now. `sent` hears of each that went.
 */
export function useOutbox(
  scope: string,
  owner: string,
  sent: (entry: KeptEntry, answer: unknown) => void,
): { kept: KeptEntry[]; ready: boolean; drain: () => void } {
  const [kept, setKept] = useState<KeptEntry[]>([]);
  const [ready, setReady] = useState(false);
  const tell = useRef(sent);
  useEffect(() => {
    tell.current = sent;
  }, [sent]);
  const drain = useCallback(() => {
    void drainOutbox(owner, (entry, answer) => {
      if (entry.scope === scope) tell.current(entry, answer);
    });
  }, [owner, scope]);

  useEffect(() => {
    let stopped = false;
    const look = async () => {
      const list = await listKept(scope, owner);
      if (stopped) return;
      setKept(list);
      setReady(true);
    };
    const changed = () => void look();
    const stop = onOutboxChange(changed);
    const seen = () => {
      if (!document.hidden) drain();
    };
    const timer = setInterval(drain, AGAIN_MS);
    window.addEventListener('online', drain);
    document.addEventListener('visibilitychange', seen);
    changed();
    drain();
    return () => {
      stopped = true;
      stop();
      clearInterval(timer);
      window.removeEventListener('online', drain);
      document.removeEventListener('visibilitychange', seen);
    };
  }, [scope, owner, drain]);

  return { kept, ready, drain };
}
