'use client';

import { Checkbox } from '@/components/ui/Checkbox';
import { Textarea } from '@/components/ui/Textarea';
import { TextInput } from '@/components/ui/TextInput';
import { send } from '@/lib/client/api';
import { textOf } from '@/lib/client/form-values';
import { UnitDialog, type NamedUnit } from './UnitDialog';

/** Reports a fault; with a doubt about safety the unit is held, so that is ticked from the start. */
export function ReportDefect({ unit }: { unit: NamedUnit }) {
  return (
    <UnitDialog
      button="Report a defect"
      title={`Defect on ${unit.fleetNumber}`}
      confirm="Report it"
      fields={['title', 'detail', 'holdsUnit']}
      done={`The defect on ${unit.fleetNumber} is reported; a task for it opens by itself.`}
      submit={(form) =>
        send('POST', '/api/v1/defects', {
          unitId: unit.id,
          title: textOf(form, 'title'),
          detail: textOf(form, 'detail') || undefined,
          holdsUnit: textOf(form, 'holdsUnit') === 'on',
        })
      }
    >
      {(error) => (
        <>
          <TextInput name="title" label="What is wrong" maxLength={120} error={error('title')} />
          <Textarea
            name="detail"
            label="What you saw or heard"
            optional
            rows={3}
            maxLength={2000}
            error={error('detail')}
          />
          <Checkbox
            name="holdsUnit"
            label="Hold the unit until this is mended"
            hint="Leave it ticked when you are not sure."
            defaultChecked
            error={error('holdsUnit')}
          />
        </>
      )}
    </UnitDialog>
  );
}
