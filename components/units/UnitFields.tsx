import { useState } from 'react';
import { Section } from '@/components/rules/Section';
import { NumberInput } from '@/components/ui/NumberInput';
import { namedOptions } from '@/components/ui/options';
import { Select } from '@/components/ui/Select';
import { TextInput } from '@/components/ui/TextInput';
import type { UnitFormData } from '@/lib/schemas/fleet';
import { carburettorText } from './unit-words';

type Props = { data: UnitFormData; error: (path: string) => string | undefined };

const only = (all: { id: string }[]) => (all.length === 1 ? (all[0]?.id ?? '') : '');

/** What is said of a unit: which it is, the numbers on its hull, and where its meter stood when it came. */
export function UnitFields({ data, error }: Props) {
  const { unit, docks, models } = data;
  const [dockId, setDockId] = useState(unit?.dockId ?? only(docks));
  const [modelId, setModelId] = useState(unit?.modelId ?? only(models));
  const model = models.find(({ id }) => id === modelId);
  const american = docks.find(({ id }) => id === dockId)?.craftNumbers !== 'other';
  return (
    <>
      <Section title="Which unit">
        <div className="grid gap-5 sm:grid-cols-2">
          <TextInput
            name="fleetNumber"
            label="Fleet number"
            hint="What your people call it."
            maxLength={20}
            autoComplete="off"
            defaultValue={unit?.fleetNumber}
            error={error('fleetNumber')}
          />
          <TextInput
            name="enteredServiceOn"
            type="date"
            label="In service since"
            hint="Calendar duties count from this day."
            defaultValue={unit?.enteredServiceOn ?? data.today}
            error={error('enteredServiceOn')}
          />
          <Select
            name="modelId"
            label="Model"
            placeholder="Choose a model"
            options={namedOptions(models)}
            value={modelId}
            onChange={(event) => setModelId(event.target.value)}
            error={error('modelId')}
          />
          <Select
            name="dockId"
            label="Dock"
            placeholder="Choose a dock"
            options={namedOptions(docks)}
            value={dockId}
            onChange={(event) => setDockId(event.target.value)}
            error={error('dockId')}
          />
        </div>
      </Section>
      <CraftNumbers unit={unit} american={american} error={error} />
      <Section title="Engine">
        <div className="grid gap-5 sm:grid-cols-2">
          {unit ? null : <FirstMeter error={error} />}
          <NumberInput
            name="carbCount"
            label="Carburettors"
            hint={
              model
                ? `Only if this unit differs: its model has ${carburettorText(model.carbCount)}.`
                : 'Only if this unit differs from its model.'
            }
            optional
            whole
            defaultValue={data.ownCarbCount ? unit?.carbCount : undefined}
            error={error('carbCount')}
          />
        </div>
      </Section>
    </>
  );
}

function CraftNumbers({
  unit,
  american,
  error,
}: Pick<Props, 'error'> & { unit: UnitFormData['unit']; american: boolean }) {
  return (
    <Section
      title="Numbers on the craft"
      hint={
        american
          ? 'Checked against the US federal formats, as the dock says.'
          : 'Of another country, as the dock says: taken as you write them.'
      }
    >
      <div className="grid gap-5 sm:grid-cols-2">
        <TextInput
          name="hin"
          label="Hull number (HIN)"
          hint={american ? '12 letters and digits, on the transom.' : undefined}
          optional
          maxLength={30}
          autoComplete="off"
          autoCapitalize="characters"
          spellCheck={false}
          className="numerals"
          defaultValue={unit?.hin ?? ''}
          error={error('hin')}
        />
        <TextInput
          name="registration"
          label="Registration"
          hint={american ? 'As NH 1234 BD, on the bow.' : undefined}
          optional
          maxLength={20}
          autoComplete="off"
          autoCapitalize="characters"
          spellCheck={false}
          className="numerals"
          defaultValue={unit?.registration ?? ''}
          error={error('registration')}
        />
      </div>
    </Section>
  );
}

function FirstMeter({ error }: Pick<Props, 'error'>) {
  return (
    <>
      <NumberInput
        name="engineHours"
        label="Meter now"
        hint="What its hour meter shows, to one place."
        suffix="h"
        error={error('engineHours')}
      />
      <NumberInput
        name="outings"
        label="Outings so far"
        hint="0 when you do not count them."
        optional
        whole
        error={error('outings')}
      />
    </>
  );
}
