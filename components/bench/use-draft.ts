'use client';

import { useCallback, useMemo, useSyncExternalStore } from 'react';

const drafts = new EventTarget();

function subscribe(listener: () => void): () => void {
  drafts.addEventListener('change', listener);
  window.addEventListener('storage', listener);
  return () => {
    drafts.removeEventListener('change', listener);
    window.removeEventListener('storage', listener);
  };
}

/**
 * Text that is being typed, kept on this device until it is entered: a reload or a closed browser leaves it there.
 * `draft` is null while nothing is typed that differs from what was entered.
 */
export function useDraft<T>(key: string): { draft: T | null; setDraft: (next: T | null) => void } {
  const kept = useSyncExternalStore(
    subscribe,
    () => localStorage.getItem(key),
    () => null,
  );
  const draft = useMemo(() => (kept === null ? null : (JSON.parse(kept) as T)), [kept]);
  const setDraft = useCallback(
    (next: T | null) => {
      if (next === null) localStorage.removeItem(key);
      else localStorage.setItem(key, JSON.stringify(next));
      drafts.dispatchEvent(new Event('change'));
    },
    [key],
  );
  return { draft, setDraft };
}
