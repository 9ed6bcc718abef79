'use client';

import { useCallback, useEffect, useRef, useState } from 'react';
import {
  drainOutbox,
  listKept,
  onOutboxChange,
  onOutboxSent,
  type KeptEntry,
  type SentEntry,
} from './outbox';

/** How soon what could not be sent is tried again, while the page is open. */
const AGAIN_MS = 4000;

/**
 * What a person entered for `scope` that the server does not have yet. It is sent at once, when the network comes
 * back, when the page is looked at again and every few seconds; `drain` sends now. `sent` hears of each that went.
 */
export function useOutbox(
  scope: string,
  owner: string,
  sent: (sent: SentEntry) => void,
): { kept: KeptEntry[]; ready: boolean; drain: () => void } {
  const [kept, setKept] = useState<KeptEntry[]>([]);
  const [ready, setReady] = useState(false);
  const tell = useRef(sent);
  useEffect(() => {
    tell.current = sent;
  }, [sent]);
  const drain = useCallback(() => void drainOutbox(owner), [owner]);

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
    const stopHearing = onOutboxSent((gone) => {
      if (gone.entry.scope === scope && gone.entry.owner === owner) tell.current(gone);
    });
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
      stopHearing();
      clearInterval(timer);
      window.removeEventListener('online', drain);
      document.removeEventListener('visibilitychange', seen);
    };
  }, [scope, owner, drain]);

  return { kept, ready, drain };
}
