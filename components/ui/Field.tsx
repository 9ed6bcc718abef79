import type { ReactNode } from 'react';

export type FieldText = {
  label: ReactNode;
  hint?: ReactNode;
  /** What is wrong and what to enter instead; marks the control as invalid. */
  error?: string | null;
  /** Says "optional" beside the label. */
  optional?: boolean;
};

export type ControlAttributes = {
  id: string;
  'aria-describedby': string | undefined;
  'aria-invalid': true | undefined;
};

/** The attributes that tie a control to the hint and error of its field. */
export function describeControl(id: string, text: Pick<FieldText, 'hint' | 'error'>): ControlAttributes {
  const parts = [text.hint ? `${id}-hint` : null, text.error ? `${id}-error` : null].filter(Boolean);
  return {
    id,
    'aria-describedby': parts.length > 0 ? parts.join(' ') : undefined,
    'aria-invalid': text.error ? true : undefined,
  };
}

/** The error of one field: a mark, the word "Error" for those who hear it, and the text. */
export function FieldError({ id, children }: { id: string; children: string }) {
  return (
    <p id={`${id}-error`} className="flex items-start gap-2 font-semibold text-danger">
      <svg viewBox="0 0 20 20" className="mt-0.5 size-5 shrink-0" aria-hidden="true">
        <path d="M10 1 19.5 18H.5Z" fill="currentColor" />
        <path d="M9 7h2v6H9zm0 7.2h2v2H9z" className="fill-paper" />
      </svg>
      <span>
        <span className="sr-only">Error: </span>
        {children}
      </span>
    </p>
  );
}

/**
 * Label, hint, control and error in reading order. `children` receives the attributes for the control;
 * the ready-made inputs call this themselves.
 */
export function Field({
  id,
  label,
  hint,
  error,
  optional,
  children,
}: FieldText & { id: string; children: (control: ControlAttributes) => ReactNode }) {
  return (
    <div
      className={
        error ? 'grid content-start gap-1.5 border-l-4 border-danger pl-3' : 'grid content-start gap-1.5'
      }
    >
      <label htmlFor={id} className="font-semibold">
        {label}
        {optional ? <span className="font-normal text-ink-soft"> (optional)</span> : null}
      </label>
      {hint ? (
        <p id={`${id}-hint`} className="text-ink-soft">
          {hint}
        </p>
      ) : null}
      {children(describeControl(id, { hint, error }))}
      {error ? <FieldError id={id}>{error}</FieldError> : null}
    </div>
  );
}
