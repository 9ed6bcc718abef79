'use client';

import { useEffect, useRef } from 'react';

export type FieldIssue = { path: string; message: string };

/**
 * Everything wrong with a form in one place, each line a link to its field (an element whose id is the
 * path). Takes the focus when it appears or its list changes. Draws nothing without errors.
 */
export function ErrorSummary({
  errors,
  title = 'Please correct this',
}: {
  errors: FieldIssue[];
  title?: string;
}) {
  const box = useRef<HTMLDivElement>(null);
  const signature = errors.map((error) => `${error.path}:${error.message}`).join('|');
  useEffect(() => {
    if (signature) box.current?.focus();
  }, [signature]);
  if (errors.length === 0) return null;
  return (
    <div
      ref={box}
      tabIndex={-1}
      role="alert"
      className="rounded border-2 border-l-8 border-danger bg-danger-tint px-4 py-3 text-ink"
    >
      <h2 className="text-lg text-danger">{title}</h2>
      <ul className="mt-1">
        {errors.map((error) => (
          <li key={`${error.path}:${error.message}`}>
            {error.path ? (
              <a
                href={`#${error.path}`}
                className="flex min-h-target items-center font-semibold text-danger underline"
              >
                {error.message}
              </a>
            ) : (
              <span className="flex min-h-target items-center">{error.message}</span>
            )}
          </li>
        ))}
      </ul>
    </div>
  );
}
