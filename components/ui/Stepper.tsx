import { buttonClass } from './button-style';
import { cx } from './cx';

/** A whole number changed one at a time, for hands in gloves. `label` says of what. */
export function Stepper({
  id,
  label,
  value,
  min = 0,
  max = 100_000,
  disabled = false,
  onChange,
}: {
  id?: string;
  label: string;
  value: number;
  min?: number;
  max?: number;
  disabled?: boolean;
  onChange: (value: number) => void;
}) {
  const step = (by: number, word: string, path: string) => (
    <button
      type="button"
      id={by > 0 ? id : undefined}
      aria-label={`One ${word} ${label}`}
      disabled={disabled || value + by < min || value + by > max}
      onClick={() => onChange(value + by)}
      className={cx(buttonClass('secondary', 'normal', false), 'size-target p-0')}
    >
      <svg viewBox="0 0 20 20" className="size-5" aria-hidden="true">
        <path d={path} stroke="currentColor" strokeWidth="3" />
      </svg>
    </button>
  );
  return (
    <div role="group" aria-label={label} className="inline-flex items-center gap-2">
      {step(-1, 'fewer', 'M3 10h14')}
      <output className="numerals min-w-10 text-center text-xl font-bold">{value}</output>
      {step(1, 'more', 'M3 10h14M10 3v14')}
    </div>
  );
}
