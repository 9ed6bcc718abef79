import { NumberInput } from '@/components/ui/NumberInput';
import { fieldError, type Failure } from '@/lib/client/api';
import { Disclosure } from './Disclosure';
import type { Typed } from './entry';

/** A new meter was fitted since the last reading: engine hours go on from the old one's end. */
export function SwapFields({
  typed,
  onChange,
  failure,
}: {
  typed: Typed;
  onChange: (part: Partial<Typed>) => void;
  failure: Failure | null;
}) {
  return (
    <Disclosure
      label="The meter was swapped"
      open={typed.swapped}
      onToggle={(swapped) => onChange({ swapped })}
    >
      <NumberInput
        name="meterSwap.oldFinal"
        label="The old meter’s last number"
        suffix="h"
        large
        value={typed.oldFinal}
        onChange={(event) => onChange({ oldFinal: event.target.value })}
        error={fieldError(failure, 'meterSwap.oldFinal')}
      />
      <NumberInput
        name="meterSwap.newFirst"
        label="The new meter’s first number"
        suffix="h"
        large
        value={typed.newFirst}
        onChange={(event) => onChange({ newFirst: event.target.value })}
        error={fieldError(failure, 'meterSwap.newFirst')}
      />
    </Disclosure>
  );
}
