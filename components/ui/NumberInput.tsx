import { useId, type ComponentProps } from 'react';
import { textControlClass } from './control-style';
import { cx } from './cx';
import { Field, type FieldText } from './Field';

export type NumberInputProps = FieldText &
  Omit<ComponentProps<'input'>, 'type' | 'inputMode'> & {
    /** The unit of measure, shown behind the number and read out with it. */
    suffix?: string;
    /** Whole numbers ask the phone for a keypad without a decimal mark. */
    whole?: boolean;
    large?: boolean;
  };

/**
 * A number as text with a number keypad: no spinner, no change by a scrolling wheel, and what was typed
 * reaches the check untouched.
 */
export function NumberInput({
  label,
  hint,
  error,
  optional,
  suffix,
  whole = false,
  large = false,
  id,
  name,
  className,
  ...rest
}: NumberInputProps) {
  const ownId = useId();
  const fieldId = id ?? name ?? ownId;
  return (
    <Field
      id={fieldId}
      label={
        suffix ? (
          <>
            {label} <span className="sr-only">({suffix})</span>
          </>
        ) : (
          label
        )
      }
      hint={hint}
      error={error}
      optional={optional}
    >
      {(control) => (
        <span className="flex max-w-60 items-stretch">
          <input
            {...rest}
            {...control}
            name={name}
            type="text"
            inputMode={whole ? 'numeric' : 'decimal'}
            autoComplete="off"
            className={cx(
              textControlClass,
              'numerals min-w-0 text-right text-lg',
              large && 'min-h-dock text-2xl',
              suffix && 'rounded-r-none border-r-0',
              className,
            )}
          />
          {suffix ? (
            <span
              aria-hidden="true"
              className="flex shrink-0 items-center rounded-r border-2 border-edge bg-shoal px-3 font-semibold"
            >
              {suffix}
            </span>
          ) : null}
        </span>
      )}
    </Field>
  );
}
