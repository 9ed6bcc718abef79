'use client';

import { useRouter } from 'next/navigation';
import { useState } from 'react';
import { Button } from '@/components/ui/Button';
import { ErrorSummary } from '@/components/ui/ErrorSummary';
import { useToast } from '@/components/ui/Toast';
import type { RuleFormData } from '@/lib/schemas/rule-form';
import { coveredUnits } from './covered';
import { RuleFields } from './RuleFields';
import { RuleMeaning } from './RuleMeaning';
import { usePreview } from './use-preview';
import { useRuleForm } from './use-rule-form';
import { useUnsavedWarning } from './use-unsaved-warning';

/** Writes a rule, or changes one; beside it stands what it means, as one types. */
export function RuleForm({ data }: { data: RuleFormData }) {
  const router = useRouter();
  const toast = useToast();
  const { rule, docks } = data;
  const readOnly = !data.mayWrite || rule?.endedAt != null;
  const state = useRuleForm(rule, docks[0]?.today ?? rule?.createdAt.slice(0, 10) ?? '', readOnly);
  const { form, checked, listed } = state;
  const covered = coveredUnits(form.draft, data);
  const [chosen, setChosen] = useState<string | null>(null);
  const unit = covered.find(({ id }) => id === chosen) ?? covered[0] ?? null;
  const dockOf = new Map(docks.map((dock) => [dock.id, dock]));
  const standing = unit && {
    id: unit.id,
    enteredServiceOn: unit.enteredServiceOn,
    engineHours: unit.engineHours,
    outings: unit.outings,
    today: dockOf.get(unit.dockId)?.today ?? '',
  };
  const preview = usePreview(checked.schedule, standing, rule?.id ?? null);
  useUnsavedWarning(state.unsaved);

  const save = async () => {
    const written = await state.save();
    if (!written) return;
    toast({
      text: `“${written.name}” is saved for ${written.unitCount} ${written.unitCount === 1 ? 'unit' : 'units'}. Their due points are being worked out.`,
    });
    router.push('/rules');
    router.refresh();
  };

  return (
    <form
      noValidate
      className="grid items-start gap-8 lg:grid-cols-[minmax(0,1fr)_24rem]"
      onSubmit={(event) => {
        event.preventDefault();
        void save();
      }}
    >
      <div className="grid min-w-0 gap-8">
        <ErrorSummary errors={listed} title="The rule is not saved" />
        <RuleFields data={data} state={state} covered={covered.length} />
      </div>
      <div className="min-w-0 lg:sticky lg:top-4 lg:max-h-[calc(100dvh-2rem)] lg:overflow-y-auto">
        <RuleMeaning
          schedule={checked.schedule}
          holdsUnit={form.draft.holdsUnit}
          units={covered.map((each) => ({
            ...each,
            label: `${each.fleetNumber} · ${dockOf.get(each.dockId)?.name ?? ''}`,
          }))}
          unitId={unit?.id ?? null}
          onUnit={setChosen}
          preview={preview}
        />
      </div>
      {readOnly ? null : (
        <div className="flex flex-wrap gap-3 border-t-2 border-line pt-4 lg:col-span-2">
          <Button type="submit" kind="primary" size="large" busy={state.busy}>
            Save the rule
          </Button>
        </div>
      )}
    </form>
  );
}
