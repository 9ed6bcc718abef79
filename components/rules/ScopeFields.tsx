import { PROPULSION_WORDS, STROKE_WORDS } from '@/components/models/model-words';
import { CheckList } from '@/components/ui/CheckList';
import { NumberInput } from '@/components/ui/NumberInput';
import { namedOptions, wordOptions } from '@/components/ui/options';
import { Select } from '@/components/ui/Select';
import type { FormState } from './form-state';

export type Choice = { id: string; name: string };

const ANY = { value: '', label: 'Any' };

/** Which units the rule is for, with how many that makes. */
export function ScopeFields({
  form,
  models,
  docks,
  covered,
  fleet,
}: {
  form: FormState;
  models: Choice[];
  docks: Choice[];
  covered: number;
  fleet: number;
}) {
  const { draft, change, errorOf, readOnly } = form;
  return (
    <div className="grid gap-4">
      <p role="status" className="text-lg font-bold">
        <span className="numerals">{covered}</span> of {fleet} units
      </p>
      <div className="grid gap-4 sm:grid-cols-2">
        <CheckList
          id="appliesTo.modelIds"
          label="Models"
          hint="None chosen means any"
          options={namedOptions(models)}
          value={draft.modelIds}
          disabled={readOnly}
          error={errorOf('appliesTo.modelIds')}
          onChange={(modelIds) => change('appliesTo.modelIds', { modelIds })}
        />
        <CheckList
          id="appliesTo.dockIds"
          label="Docks"
          hint="None chosen means any"
          options={namedOptions(docks)}
          value={draft.dockIds}
          disabled={readOnly}
          error={errorOf('appliesTo.dockIds')}
          onChange={(dockIds) => change('appliesTo.dockIds', { dockIds })}
        />
        <Select
          label="Propulsion"
          id="appliesTo.propulsion"
          options={[ANY, ...wordOptions(PROPULSION_WORDS)]}
          value={draft.propulsion}
          disabled={readOnly}
          onChange={(event) => change('appliesTo.propulsion', { propulsion: event.target.value })}
        />
        <Select
          label="Stroke"
          id="appliesTo.stroke"
          options={[ANY, ...wordOptions(STROKE_WORDS)]}
          value={draft.stroke}
          disabled={readOnly}
          onChange={(event) => change('appliesTo.stroke', { stroke: event.target.value })}
        />
        <NumberInput
          label="Carburettors, at least"
          optional
          whole
          id="appliesTo.carbCount.min"
          value={draft.carbMin}
          readOnly={readOnly}
          error={errorOf('appliesTo.carbCount.min')}
          onChange={(event) => change('appliesTo.carbCount.min', { carbMin: event.target.value })}
        />
        <NumberInput
          label="Carburettors, at most"
          optional
          whole
          id="appliesTo.carbCount.max"
          value={draft.carbMax}
          readOnly={readOnly}
          error={errorOf('appliesTo.carbCount.max')}
          onChange={(event) => change('appliesTo.carbCount.max', { carbMax: event.target.value })}
        />
      </div>
    </div>
  );
}
