'use client';

import { Checkbox } from '@/components/ui/Checkbox';
import { NumberInput } from '@/components/ui/NumberInput';
import { TextInput } from '@/components/ui/TextInput';
import { send } from '@/lib/client/api';
import { numberOf, textOf } from '@/lib/client/form-values';
import { UnitDialog } from './UnitDialog';

/** Voids a mistaken reading with a reason; the right value may take its place. Due points follow. */
export function VoidReading({
  readingId,
  what,
  swap = false,
  outing = false,
}: {
  readingId: string;
  /** The reading in words, as "the reading of 101.5 h". */
  what: string;
  /** Of a meter swap, whose two readings are void together. */
  swap?: boolean;
  /** It ended an outing. */
  outing?: boolean;
}) {
  return (
    <UnitDialog
      button={swap ? 'Void the swap' : 'Void this reading'}
      kind="quiet"
      title={`Void ${what}?`}
      confirm="Void it"
      danger
      fields={['reason', 'replacement.hours', 'outingHappened']}
      done={`${what.charAt(0).toUpperCase()}${what.slice(1)} is void.`}
      submit={(form) => {
        const hours = numberOf(form, 'replacement.hours');
        return send('POST', `/api/v1/readings/${readingId}/voiding`, {
          reason: textOf(form, 'reason'),
          ...(hours !== undefined && { replacement: { hours } }),
          ...(textOf(form, 'noOuting') === 'on' && { outingHappened: false }),
        });
      }}
    >
      {(error) => (
        <>
          <p>It stays in the history, struck through. What comes due is worked out from what is left.</p>
          <TextInput
            name="reason"
            label="Reason"
            hint="What was wrong with it."
            maxLength={500}
            error={error('reason')}
          />
          {swap ? null : (
            <NumberInput
              name="replacement.hours"
              label="What the meter showed instead"
              optional
              suffix="h"
              error={error('replacement.hours')}
            />
          )}
          {outing ? (
            <Checkbox
              name="noOuting"
              label="The outing never happened either"
              error={error('outingHappened')}
            />
          ) : null}
        </>
      )}
    </UnitDialog>
  );
}
