'use client';

import { Checkbox } from '@/components/ui/Checkbox';
import { Textarea } from '@/components/ui/Textarea';
import { TextInput } from '@/components/ui/TextInput';
import { keepFile, type FileOf } from '@/components/files/use-files';
import { send } from '@/lib/client/api';
import { makeId } from '@/lib/client/entry-id';
import { textOf } from '@/lib/client/form-values';
import { UnitDialog, type NamedUnit } from './UnitDialog';

/** Reports a fault; with a doubt about safety the unit is held, so that is ticked from the start. */
export function ReportDefect({ unit, me }: { unit: NamedUnit; me: string }) {
  return (
    <UnitDialog
      button="Report a defect"
      title={`Defect on ${unit.fleetNumber}`}
      confirm="Report it"
      fields={['title', 'detail', 'holdsUnit']}
      done={`The defect on ${unit.fleetNumber} is reported; a task for it opens by itself.`}
      submit={async (form) => {
        const defectId = makeId();
        const answer = await send('POST', '/api/v1/defects', {
          id: defectId,
          unitId: unit.id,
          title: textOf(form, 'title'),
          detail: textOf(form, 'detail') || undefined,
          holdsUnit: textOf(form, 'holdsUnit') === 'on',
        });
        if (answer.ok) await keepPictures(form, { unitId: unit.id, defectId }, me);
        return answer;
      }}
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
          <label className="grid gap-1.5">
            <span className="font-semibold">
              Pictures <span className="font-normal text-ink-soft">(optional)</span>
            </span>
            <input
              name="pictures"
              type="file"
              accept="image/*"
              multiple
              className="min-h-target file:mr-3 file:min-h-target file:rounded file:border-2 file:border-edge file:bg-raised file:px-4 file:font-semibold file:text-ink"
            />
          </label>
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

/** The pictures go in their turn: what cannot be sent now waits on this device. */
async function keepPictures(form: HTMLFormElement, of: FileOf, owner: string): Promise<void> {
  const chosen = new FormData(form).getAll('pictures');
  for (const file of chosen)
    if (file instanceof File && file.size > 0)
      await keepFile(file, of, { scope: `files:${of.unitId}`, owner });
}
