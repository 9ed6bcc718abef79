'use client';

import { createContext, useCallback, useContext, useEffect, useMemo, useState, type ReactNode } from 'react';

export type ToastMessage = {
  text: string;
  /** Takes the deed back; the toast then stays until it is answered or dismissed. */
  undo?: { label?: string; run: () => void };
};

type ShowToast = (message: ToastMessage) => void;

const ToastContext = createContext<ShowToast | null>(null);
const shownForMs = 8_000;

/** Gives the function that shows a toast. Throws outside of `ToastProvider`. */
export function useToast(): ShowToast {
  const show = useContext(ToastContext);
  if (!show) throw new Error('useToast needs a ToastProvider above it');
  return show;
}

/**
 * One short message at a time at the foot of the screen, announced politely. One without an undo goes
 * after eight seconds; one with an undo waits, since nobody should have to race it.
 */
export function ToastProvider({ children }: { children: ReactNode }) {
  const [message, setMessage] = useState<ToastMessage | null>(null);
  const dismiss = useCallback(() => setMessage(null), []);
  const show = useMemo<ShowToast>(() => (next) => setMessage({ ...next }), []);
  useEffect(() => {
    if (!message || message.undo) return;
    const timer = setTimeout(dismiss, shownForMs);
    return () => clearTimeout(timer);
  }, [message, dismiss]);
  return (
    <ToastContext value={show}>
      {children}
      <div
        role="status"
        className="no-print pointer-events-none fixed inset-x-0 bottom-20 z-40 flex justify-center px-4 md:bottom-6"
      >
        {message ? (
          <div className="pointer-events-auto flex max-w-xl items-center gap-2 rounded-hull border-2 border-paper bg-ink py-1 pr-1 pl-4 text-paper">
            <span className="min-w-0 py-2">{message.text}</span>
            {message.undo ? (
              <button
                type="button"
                onClick={() => {
                  message.undo?.run();
                  dismiss();
                }}
                className="min-h-target min-w-target px-3 font-bold underline underline-offset-4"
              >
                {message.undo.label ?? 'Undo'}
              </button>
            ) : null}
            <button
              type="button"
              onClick={dismiss}
              className="flex size-target shrink-0 items-center justify-center"
            >
              <svg viewBox="0 0 20 20" className="size-4" aria-hidden="true">
                <path d="M3 3l14 14M17 3 3 17" stroke="currentColor" strokeWidth="2.5" />
              </svg>
              <span className="sr-only">Dismiss</span>
            </button>
          </div>
        ) : null}
      </div>
    </ToastContext>
  );
}
