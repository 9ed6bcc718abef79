import { useId, type ComponentProps } from 'react';
import { textControlClass } from './control-style';
import { cx } from './cx';
import { Field, type FieldText } from './Field';

export type TextareaProps = FieldText & ComponentProps<'textarea'>;

/** Several lines of text with their label. */
export function Textarea({
  label,
  hint,
  error,
  optional,
  id,
  name,
  rows = 4,
  className,
  ...rest
}: TextareaProps) {
  const ownId = useId();
  return (
    <Field id={id ?? name ?? ownId} label={label} hint={hint} error={error} optional={optional}>
      {(control) => (
        <textarea
          {...rest}
          {...control}
          name={name}
          rows={rows}
          className={cx(textControlClass, className)}
        />
      )}
    </Field>
  );
}
