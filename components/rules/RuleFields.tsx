import { Button } from '@/components/ui/Button';
import { Checkbox } from '@/components/ui/Checkbox';
import { Notice } from '@/components/ui/Notice';
import { RadioGroup } from '@/components/ui/RadioGroup';
import { Select } from '@/components/ui/Select';
import { TextInput } from '@/components/ui/TextInput';
import type { RuleFormData } from '@/lib/schemas/rule-form';
import { KIND_WORDS } from './due-words';
import { LabourFields } from './LabourFields';
import { PartFields } from './PartFields';
import { labourOf, type RuleDraft } from './rule-draft';
import { ScopeFields } from './ScopeFields';
import { Section } from './Section';
import { TriggerEditor } from './TriggerEditor';
import type { useRuleForm } from './use-rule-form';
import { WindowFields } from './WindowFields';

const KINDS = (['inspection', 'service', 'rebuild'] as const).map((value) => ({
  value,
  label: KIND_WORDS[value],
}));
const MOST_TRIGGERS = 8;

/** The questions a rule answers, in the order one thinks of them. */
export function RuleFields({
  data,
  state,
  covered,
}: {
  data: RuleFormData;
  state: ReturnType<typeof useRuleForm>;
  covered: number;
}) {
  const { form } = state;
  const { draft, change, errorOf, readOnly } = form;
  return (
    <>
      <Notice tone="warn" still>
        The engine maker’s manual comes first. Where it asks for the work sooner than this rule, follow the
        manual and change the rule.
      </Notice>
      <Section title="What is done">
        <TextInput
          label="Name"
          id="name"
          maxLength={80}
          value={draft.name}
          readOnly={readOnly}
          error={errorOf('name')}
          onChange={(event) => change('name', { name: event.target.value })}
        />
        <RadioGroup
          label="Kind"
          name="kind"
          id="kind"
          look="segmented"
          options={KINDS}
          value={draft.kind}
          disabled={readOnly}
          onChange={(event) => change('kind', { kind: event.target.value as RuleDraft['kind'] })}
        />
        <WorkFields form={form} procedures={data.procedures} />
      </Section>
      <Section
        title="How often"
        hint="With more than one, whichever comes first is due, and doing it once answers all."
      >
        {draft.triggers.map((trigger, index) => (
          <TriggerEditor
            key={trigger.key}
            form={form}
            trigger={trigger}
            index={index}
            onRemove={draft.triggers.length > 1 ? () => state.removeTrigger(index) : undefined}
          />
        ))}
        {readOnly || draft.triggers.length >= MOST_TRIGGERS ? null : (
          <div>
            <Button onClick={state.addTrigger}>Add another trigger</Button>
          </div>
        )}
      </Section>
      <Section
        title="How early and how late"
        hint="Upcoming from so much before it is due. Done within what is early and late, it counts as on schedule."
      >
        <WindowFields form={form} />
        <Checkbox
          label="Late work holds the unit: it may not be hired out until the work is done"
          id="holdsUnit"
          checked={draft.holdsUnit}
          disabled={readOnly}
          onChange={(event) => change('holdsUnit', { holdsUnit: event.target.checked })}
        />
      </Section>
      <Section title="For which units" hint="A unit is covered when everything chosen here fits it.">
        <ScopeFields
          form={form}
          models={data.models}
          docks={data.docks}
          covered={covered}
          fleet={data.fleet.length}
        />
      </Section>
      <Section title="How long the work takes">
        <LabourFields form={form} labour={labourOf(draft)} />
      </Section>
      <Section
        title="What parts it takes"
        hint="A task sets them aside when it is started, and takes them out when it is closed."
      >
        <PartFields form={form} parts={data.parts} />
      </Section>
    </>
  );
}

/** What the work follows, and who signs for it. */
function WorkFields({
  form: { draft, change, errorOf, readOnly },
  procedures,
}: {
  form: ReturnType<typeof useRuleForm>['form'];
  procedures: RuleFormData['procedures'];
}) {
  return (
    <>
      <Select
        label="Procedure"
        optional
        id="procedureId"
        hint="The steps that its tasks follow."
        placeholder="None"
        options={procedures.map(({ id, name }) => ({ value: id, label: name }))}
        value={draft.procedureId}
        disabled={readOnly}
        error={errorOf('procedureId')}
        onChange={(event) => change('procedureId', { procedureId: event.target.value })}
      />
      <Checkbox
        label="A second person looks at the work and signs before it is closed"
        id="wantsSecondPerson"
        checked={draft.wantsSecondPerson}
        disabled={readOnly}
        onChange={(event) => change('wantsSecondPerson', { wantsSecondPerson: event.target.checked })}
      />
      <Checkbox
        label="A test ride is signed for before it is closed"
        id="wantsTestRide"
        checked={draft.wantsTestRide}
        disabled={readOnly}
        onChange={(event) => change('wantsTestRide', { wantsTestRide: event.target.checked })}
      />
    </>
  );
}
