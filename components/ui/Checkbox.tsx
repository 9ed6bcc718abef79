import { useId, type ComponentProps } from 'react';
import { describeControl, FieldError, type FieldText } from './Field';

export type CheckboxProps = Omit<FieldText, 'optional'> & Omit<ComponentProps<'input'>, 'type'>;

/** One yes or no. The whole line is the target. */
export function Checkbox({ label, hint, error, id, name, ...rest }: CheckboxProps) {
  const ownId = useId();
  const fieldId = id ?? name ?? ownId;
  return (
    <div className="grid content-start gap-1">
      <label className="flex min-h-target cursor-pointer items-center gap-3">
        <input
          {...rest}
          {...describeControl(fieldId, { hint, error })}
          name={name}
          type="checkbox"
          className="size-6 shrink-0"
        />
        <span>{label}</span>
      </label>
      {hint ? (
        <p id={`${fieldId}-hint`} className="-mt-2 pl-9 text-ink-soft">
          {hint}
        </p>
      ) : null}
      {error ? <FieldError id={fieldId}>{error}</FieldError> : null}
    </div>
  );
}
