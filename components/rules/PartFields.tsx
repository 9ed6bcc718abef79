import { Button } from '@/components/ui/Button';
import { NumberInput } from '@/components/ui/NumberInput';
import { wordOptions } from '@/components/ui/options';
import { Select } from '@/components/ui/Select';
import { partOptions, PER_WORDS } from '@/components/parts/part-words';
import type { RuleFormData } from '@/lib/schemas/rule-form';
import type { FormState } from './form-state';
import type { PartDraft } from './rule-draft';

/** The parts that the work takes, and for each of what. */
export function PartFields({ form, parts }: { form: FormState; parts: RuleFormData['parts'] }) {
  const { draft, change, errorOf, readOnly } = form;
  const put = (path: string, key: number, part: Partial<PartDraft>) =>
    change(path, { parts: draft.parts.map((row) => (row.key === key ? { ...row, ...part } : row)) });
  const next = 1 + Math.max(-1, ...draft.parts.map(({ key }) => key));
  return (
    <div className="grid gap-4">
      {draft.parts.length === 0 ? <p className="text-ink-soft">None.</p> : null}
      {draft.parts.map((row, index) => {
        const path = `parts.${index}`;
        return (
          <fieldset key={row.key} className="grid min-w-0 items-end gap-3 sm:grid-cols-[3fr_1fr_2fr_auto]">
            <legend className="sr-only">Part {index + 1}</legend>
            <Select
              label="Part"
              id={`${path}.partId`}
              placeholder="Choose a part"
              options={partOptions(parts)}
              value={row.partId}
              disabled={readOnly}
              error={errorOf(`${path}.partId`)}
              onChange={(event) => put(`${path}.partId`, row.key, { partId: event.target.value })}
            />
            <NumberInput
              label="How many"
              id={`${path}.quantity`}
              whole
              value={row.quantity}
              readOnly={readOnly}
              error={errorOf(`${path}.quantity`)}
              onChange={(event) => put(`${path}.quantity`, row.key, { quantity: event.target.value })}
            />
            <Select
              label="Per"
              id={`${path}.per`}
              options={wordOptions(PER_WORDS)}
              value={row.per}
              disabled={readOnly}
              onChange={(event) =>
                put(`${path}.per`, row.key, { per: event.target.value as PartDraft['per'] })
              }
            />
            {readOnly ? null : (
              <Button
                kind="quiet"
                onClick={() => change('parts', { parts: draft.parts.filter(({ key }) => key !== row.key) })}
              >
                Remove
              </Button>
            )}
          </fieldset>
        );
      })}
      {readOnly || draft.parts.length >= 50 ? null : (
        <div>
          <Button
            disabled={parts.length === 0}
            onClick={() =>
              change('parts', {
                parts: [...draft.parts, { key: next, partId: '', quantity: '1', per: 'unit' }],
              })
            }
          >
            Add a part
          </Button>
          {parts.length === 0 ? (
            <p className="mt-2 text-ink-soft">Add parts on the Parts screen first.</p>
          ) : null}
        </div>
      )}
    </div>
  );
}
