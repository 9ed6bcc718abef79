'use client';

import { TextInput } from '@/components/ui/TextInput';
import { send } from '@/lib/client/api';
import { textOf } from '@/lib/client/form-values';
import { UnitDialog, type NamedUnit } from './UnitDialog';

/** Takes the unit out of service on purpose: for the winter, an event, or a sale. */
export function LayUpUnit({ unit, today }: { unit: NamedUnit; today: string }) {
  return (
    <UnitDialog
      button="Lay up"
      title={`Lay up ${unit.fleetNumber}`}
      confirm="Lay it up"
      fields={['fromOn', 'untilOn', 'reason']}
      done={`${unit.fleetNumber} is laid up.`}
      submit={(form) =>
        send('POST', '/api/v1/lay-ups', {
          unitId: unit.id,
          fromOn: textOf(form, 'fromOn'),
          untilOn: textOf(form, 'untilOn') || undefined,
          reason: textOf(form, 'reason'),
        })
      }
    >
      {(error) => (
        <>
          <p>It is held from the first day to the last, or until somebody ends the lay-up.</p>
          <div className="grid gap-5 sm:grid-cols-2">
            <TextInput
              name="fromOn"
              type="date"
              label="First day"
              defaultValue={today}
              error={error('fromOn')}
            />
            <TextInput name="untilOn" type="date" label="Last day" optional error={error('untilOn')} />
          </div>
          <TextInput name="reason" label="Reason" maxLength={300} error={error('reason')} />
        </>
      )}
    </UnitDialog>
  );
}
