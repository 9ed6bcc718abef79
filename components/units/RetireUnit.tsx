'use client';

import { send } from '@/lib/client/api';
import { UnitDialog, type NamedUnit } from './UnitDialog';

/** Retires a unit for good, after asking. */
export function RetireUnit({ unit }: { unit: NamedUnit }) {
  return (
    <UnitDialog
      button="Retire the unit"
      title={`Retire ${unit.fleetNumber} for good?`}
      confirm="Retire it"
      danger
      fields={[]}
      done={`${unit.fleetNumber} is retired.`}
      submit={() => send('PATCH', `/api/v1/units/${unit.id}`, { retired: true })}
    >
      {() => (
        <p>
          It leaves every list of units and nothing comes due on it any more. Its history is kept. This cannot
          be taken back: a craft that returns is added as a new unit.
        </p>
      )}
    </UnitDialog>
  );
}
