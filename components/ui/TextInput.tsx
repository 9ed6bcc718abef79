import { useId, type ComponentProps } from 'react';
import { textControlClass } from './control-style';
import { cx } from './cx';
import { Field, type FieldText } from './Field';

export type TextInputProps = FieldText & ComponentProps<'input'> & { large?: boolean };

/** One line of text with its label. Its id is `id`, else `name`, so an error summary can link to it. */
export function TextInput({
  label,
  hint,
  error,
  optional,
  id,
  name,
  large = false,
  className,
  type = 'text',
  ...rest
}: TextInputProps) {
  const ownId = useId();
  return (
    <Field id={id ?? name ?? ownId} label={label} hint={hint} error={error} optional={optional}>
      {(control) => (
        <input
          {...rest}
          {...control}
          name={name}
          type={type}
          className={cx(textControlClass, large && 'min-h-dock text-lg', className)}
        />
      )}
    </Field>
  );
}
