'use client';

import { useId, type ReactNode } from 'react';
import { cx } from './cx';
import { describeControl, FieldError } from './Field';
import { cleanTyped, pressKey, type KeypadKey } from './keypad-value';

const keys: KeypadKey[] = ['1', '2', '3', '4', '5', '6', '7', '8', '9', '.', '0', 'back'];

export type KeypadProps = {
  label: ReactNode;
  /** What is shown: digits with at most one decimal mark, `''` for nothing yet. */
  value: string;
  onChange: (value: string) => void;
  /** The unit of measure behind the number. */
  suffix: string;
  hint?: ReactNode;
  error?: string | null;
  id?: string;
  name?: string;
  decimals?: number;
  wholeDigits?: number;
};

/**
 * A large number pad for wet or gloved fingers: every key is 64 px high. The number itself is a text field
 * without the phone's own keyboard, so a hardware keyboard and assistive technology can type into it too.
 */
export function Keypad({
  label,
  value,
  onChange,
  suffix,
  hint,
  error,
  id,
  name,
  decimals = 1,
  wholeDigits = 5,
}: KeypadProps) {
  const ownId = useId();
  const fieldId = id ?? name ?? ownId;
  return (
    <div className="grid max-w-md gap-2">
      <label htmlFor={fieldId} className="text-lg font-semibold">
        {label} <span className="sr-only">({suffix})</span>
      </label>
      {hint ? (
        <p id={`${fieldId}-hint`} className="text-ink-soft">
          {hint}
        </p>
      ) : null}
      <div
        className={cx(
          'flex items-baseline gap-3 border-b-4 bg-raised px-3 pt-2 has-focus-visible:outline-3 has-focus-visible:outline-offset-2 has-focus-visible:outline-sign',
          error ? 'border-danger' : 'border-line',
        )}
      >
        <input
          {...describeControl(fieldId, { hint, error })}
          name={name}
          type="text"
          inputMode="none"
          autoComplete="off"
          value={value}
          onChange={(event) => onChange(cleanTyped(event.target.value, decimals, wholeDigits))}
          className="numerals h-20 w-full min-w-0 bg-transparent text-right text-6xl font-semibold outline-none"
        />
        <span aria-hidden="true" className="text-2xl font-semibold text-ink-soft">
          {suffix}
        </span>
      </div>
      {error ? <FieldError id={fieldId}>{error}</FieldError> : null}
      <div role="group" aria-label="Number keys" className="grid grid-cols-3 gap-2">
        {keys.map((key) =>
          key === '.' && decimals === 0 ? (
            <span key={key} />
          ) : (
            <button
              key={key}
              type="button"
              aria-label={key === 'back' ? 'Delete last digit' : key === '.' ? 'Decimal point' : undefined}
              onClick={() => onChange(pressKey(value, key, decimals, wholeDigits))}
              className="numerals flex h-16 touch-manipulation items-center justify-center rounded border-2 border-edge bg-raised text-3xl font-semibold select-none hover:bg-shoal active:border-act active:bg-act active:text-act-ink"
            >
              {key === 'back' ? <BackMark /> : key}
            </button>
          ),
        )}
      </div>
    </div>
  );
}

function BackMark() {
  return (
    <svg viewBox="0 0 28 20" className="h-6" aria-hidden="true">
      <path d="M9 2h17v16H9L2 10Z" fill="none" stroke="currentColor" strokeWidth="2.2" />
      <path d="m13 6.5 7 7m0-7-7 7" stroke="currentColor" strokeWidth="2.2" />
    </svg>
  );
}
