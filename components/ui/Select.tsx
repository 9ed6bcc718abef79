import { useId, type ComponentProps } from 'react';
import { controlClass } from './control-style';
import { cx } from './cx';
import { Field, type FieldText } from './Field';

export type SelectOption = { value: string; label: string; disabled?: boolean };

export type SelectProps = FieldText &
  ComponentProps<'select'> & { options: SelectOption[]; placeholder?: string; large?: boolean };

/** A native list to choose from. `placeholder` is an empty first choice. */
export function Select({
  label,
  hint,
  error,
  optional,
  options,
  placeholder,
  large = false,
  id,
  name,
  className,
  ...rest
}: SelectProps) {
  const ownId = useId();
  return (
    <Field id={id ?? name ?? ownId} label={label} hint={hint} error={error} optional={optional}>
      {(control) => (
        <select
          {...rest}
          {...control}
          name={name}
          className={cx(controlClass, large && 'min-h-dock text-lg', className)}
        >
          {placeholder === undefined ? null : <option value="">{placeholder}</option>}
          {options.map((option) => (
            <option key={option.value} value={option.value} disabled={option.disabled}>
              {option.label}
            </option>
          ))}
        </select>
      )}
    </Field>
  );
}
