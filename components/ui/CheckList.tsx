import { describeControl, FieldError, type FieldText } from './Field';

/** Any number of a list, each a whole line to press. Scrolls by itself when it is long. */
export function CheckList({
  id,
  label,
  hint,
  error,
  options,
  value,
  disabled = false,
  onChange,
}: FieldText & {
  id: string;
  options: { value: string; label: string }[];
  value: readonly string[];
  disabled?: boolean;
  onChange: (value: string[]) => void;
}) {
  const described = describeControl(id, { hint, error });
  return (
    <fieldset className="grid min-w-0 content-start gap-1.5" aria-describedby={described['aria-describedby']}>
      <legend className="float-left mb-1.5 font-semibold">{label}</legend>
      {hint ? (
        <p id={`${id}-hint`} className="text-ink-soft">
          {hint}
        </p>
      ) : null}
      <div
        id={id}
        role="group"
        tabIndex={options.length > 5 ? 0 : undefined}
        aria-label={typeof label === 'string' ? label : undefined}
        className="grid max-h-64 overflow-y-auto rounded border-2 border-edge bg-raised px-3"
      >
        {options.map((option) => (
          <label key={option.value} className="flex min-h-target cursor-pointer items-center gap-3">
            <input
              type="checkbox"
              className="size-6 shrink-0"
              checked={value.includes(option.value)}
              disabled={disabled}
              onChange={(event) =>
                onChange(
                  event.target.checked
                    ? [...value, option.value]
                    : value.filter((chosen) => chosen !== option.value),
                )
              }
            />
            {option.label}
          </label>
        ))}
      </div>
      {error ? <FieldError id={id}>{error}</FieldError> : null}
    </fieldset>
  );
}
