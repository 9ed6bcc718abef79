import { useId, type ComponentProps, type ReactNode } from 'react';
import { cx } from './cx';
import { describeControl, FieldError, type FieldText } from './Field';

export type RadioOption = { value: string; label: ReactNode; hint?: ReactNode; disabled?: boolean };

export type RadioGroupProps = FieldText &
  Omit<ComponentProps<'input'>, 'type' | 'name' | 'value' | 'defaultValue' | 'checked'> & {
    name: string;
    options: RadioOption[];
    value?: string;
    defaultValue?: string;
    /** `segmented` lays short choices side by side as one bar; `list` stacks them with their hints. */
    look?: 'list' | 'segmented';
    large?: boolean;
    /** Says the label to assistive technology only, where the choices speak for themselves. */
    quiet?: boolean;
  };

/** One of a few. Native radio buttons, so arrow keys, forms and assistive technology just work. */
export function RadioGroup({
  label,
  hint,
  error,
  optional,
  options,
  value,
  defaultValue,
  look = 'list',
  large = false,
  quiet = false,
  id,
  className,
  ...rest
}: RadioGroupProps) {
  const ownId = useId();
  const groupId = id ?? ownId;
  const described = describeControl(groupId, { hint, error });
  const segmented = look === 'segmented';
  return (
    <fieldset
      className={cx('grid min-w-0 content-start gap-1.5', className)}
      role="radiogroup"
      aria-describedby={described['aria-describedby']}
      aria-invalid={described['aria-invalid']}
    >
      <legend className={quiet ? 'sr-only' : 'float-left mb-1.5 font-semibold'}>
        {label}
        {optional ? <span className="font-normal text-ink-soft"> (optional)</span> : null}
      </legend>
      {hint ? (
        <p id={`${groupId}-hint`} className="text-ink-soft">
          {hint}
        </p>
      ) : null}
      <div className={segmented ? 'flex flex-wrap gap-y-2' : 'grid gap-1'}>
        {options.map((option, index) => (
          <label
            key={option.value}
            className={cx(
              'flex cursor-pointer items-center gap-3',
              large ? 'min-h-dock' : 'min-h-target',
              segmented &&
                'relative border-2 border-edge bg-raised px-4 font-semibold not-first:-ml-0.5 first:rounded-l last:rounded-r has-checked:z-10 has-checked:border-act has-checked:bg-act has-checked:text-act-ink has-focus-visible:z-10 has-focus-visible:outline-3 has-focus-visible:outline-offset-2 has-focus-visible:outline-sign',
              option.disabled && 'cursor-not-allowed text-ink-soft',
            )}
          >
            <input
              {...rest}
              id={index === 0 ? groupId : undefined}
              type="radio"
              value={option.value}
              checked={value === undefined ? undefined : value === option.value}
              defaultChecked={defaultValue === undefined ? undefined : defaultValue === option.value}
              disabled={option.disabled || rest.disabled}
              className={segmented ? 'absolute inset-0 cursor-pointer opacity-0' : 'size-6 shrink-0'}
            />
            <span>
              {option.label}
              {option.hint ? <span className="block text-ink-soft">{option.hint}</span> : null}
            </span>
          </label>
        ))}
      </div>
      {error ? <FieldError id={groupId}>{error}</FieldError> : null}
    </fieldset>
  );
}
