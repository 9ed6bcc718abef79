import { NumberInput } from '@/components/ui/NumberInput';
import { wordOptions } from '@/components/ui/options';
import { RadioGroup } from '@/components/ui/RadioGroup';
import type { Model } from '@/lib/schemas/model';
import { PROPULSION_WORDS, STROKE_WORDS } from './model-words';

/** What drives a model. An electric motor has neither stroke nor carburettors, so they are not asked for. */
export function EngineFields({
  model,
  propulsion,
  onPropulsion,
  disabled,
  error,
}: {
  model: Model | null;
  propulsion: Model['propulsion'];
  onPropulsion: (propulsion: Model['propulsion']) => void;
  disabled: boolean;
  error: (path: string) => string | undefined;
}) {
  const electric = propulsion === 'electric';
  return (
    <>
      <RadioGroup
        name="propulsion"
        id="propulsion"
        label="Propulsion"
        look="segmented"
        options={wordOptions(PROPULSION_WORDS)}
        value={propulsion}
        disabled={disabled}
        error={error('propulsion')}
        onChange={(event) => onPropulsion(event.target.value as Model['propulsion'])}
      />
      {electric ? null : (
        <RadioGroup
          name="stroke"
          id="stroke"
          label="Stroke"
          look="segmented"
          options={wordOptions(STROKE_WORDS)}
          defaultValue={model?.stroke ?? undefined}
          disabled={disabled}
          error={error('stroke')}
        />
      )}
      <div className="grid gap-5 sm:grid-cols-3 sm:items-end">
        <NumberInput
          name="engines"
          label={electric ? 'Motors' : 'Engines'}
          whole
          defaultValue={model?.engines ?? 1}
          disabled={disabled}
          error={error('engines')}
        />
        {electric ? null : (
          <>
            <NumberInput
              name="cylinders"
              label="Cylinders"
              whole
              defaultValue={model?.cylinders}
              disabled={disabled}
              error={error('cylinders')}
            />
            <NumberInput
              name="carbCount"
              label="Carburettors"
              hint="0 for injection."
              whole
              defaultValue={model?.carbCount}
              disabled={disabled}
              error={error('carbCount')}
            />
          </>
        )}
      </div>
    </>
  );
}
