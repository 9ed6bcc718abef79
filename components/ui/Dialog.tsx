'use client';

import { useEffect, useId, useRef, type ReactNode } from 'react';
import { cx } from './cx';

/**
 * A modal question on the native `<dialog>`: focus stays inside, Escape and the close button call
 * `onClose`, and focus goes back to where it came from. `sheet` rises from the bottom of a phone.
 */
export function Dialog({
  open,
  onClose,
  title,
  children,
  footer,
  sheet = false,
}: {
  open: boolean;
  onClose: () => void;
  title: ReactNode;
  children?: ReactNode;
  footer?: ReactNode;
  sheet?: boolean;
}) {
  const dialog = useRef<HTMLDialogElement>(null);
  const titleId = useId();
  useEffect(() => {
    const element = dialog.current;
    if (!element) return;
    if (open && !element.open) element.showModal();
    if (!open && element.open) element.close();
  }, [open]);
  return (
    <dialog
      ref={dialog}
      aria-labelledby={titleId}
      onCancel={(event) => {
        event.preventDefault();
        onClose();
      }}
      onClose={() => {
        if (open) onClose();
      }}
      onClick={(event) => {
        if (event.target === event.currentTarget) onClose();
      }}
      className={cx(
        'max-h-[92dvh] w-[calc(100vw-2rem)] max-w-xl overflow-y-auto border-t-4 border-line bg-raised p-0 text-ink',
        sheet ? 'mx-auto mt-auto mb-0 w-full max-w-none sm:m-auto sm:max-w-xl' : 'm-auto',
      )}
    >
      <div className="flex items-start justify-between gap-4 px-5 pt-4">
        <h2 id={titleId} className="pt-1.5 text-xl">
          {title}
        </h2>
        <button
          type="button"
          onClick={onClose}
          className="-mt-1 -mr-2 flex size-target shrink-0 items-center justify-center rounded hover:bg-shoal"
        >
          <svg viewBox="0 0 20 20" className="size-5" aria-hidden="true">
            <path d="M3 3l14 14M17 3 3 17" stroke="currentColor" strokeWidth="2.5" />
          </svg>
          <span className="sr-only">Close</span>
        </button>
      </div>
      <div className="px-5 pt-3 pb-5">{children}</div>
      {footer ? (
        <div className="sticky bottom-0 flex flex-wrap justify-end gap-2 border-t border-hairline bg-raised px-5 py-3">
          {footer}
        </div>
      ) : null}
    </dialog>
  );
}
