'use client';

import { send } from '@/lib/client/api';
import { UnitDialog, type NamedUnit } from './UnitDialog';

/** Brings a laid-up unit back into service. */
export function EndLayUp({ unit, layUpId }: { unit: NamedUnit; layUpId: string }) {
  return (
    <UnitDialog
      button="End the lay-up"
      title={`Bring ${unit.fleetNumber} back into service?`}
      confirm="End the lay-up"
      fields={[]}
      done={`The lay-up of ${unit.fleetNumber} has ended.`}
      submit={() => send('POST', `/api/v1/lay-ups/${layUpId}/ending`)}
    >
      {() => <p>The lay-up ends now. Whatever else holds the unit still does.</p>}
    </UnitDialog>
  );
}
