'use client';

import { useRouter } from 'next/navigation';
import { Button } from '@/components/ui/Button';
import { TextInput } from '@/components/ui/TextInput';
import { useToast } from '@/components/ui/Toast';
import type { UnitBaselines } from '@/lib/schemas/baseline';
import { BaselineRow } from './BaselineRow';
import { useBaselines } from './use-baselines';
import { useUnsavedWarning } from './use-unsaved-warning';

/** "Last done at …" for every rule of a unit, for craft that come with a past; saved one by one or together. */
export function BaselineForm({ data }: { data: UnitBaselines }) {
  const router = useRouter();
  const toast = useToast();
  const { unit, standing } = data;
  const form = useBaselines(unit.id);
  useUnsavedWarning(form.filled.length > 0);

  const save = async (ruleIds: readonly string[]) => {
    const { recorded, refused } = await form.save(ruleIds);
    if (recorded > 0) {
      const done = `${recorded} ${recorded === 1 ? 'baseline' : 'baselines'} recorded for ${unit.fleetNumber}.`;
      toast({ text: refused > 0 ? `${done} ${refused} could not be: see the rows marked below.` : done });
    }
    router.refresh();
  };

  return (
    <form
      noValidate
      className="grid gap-5"
      onSubmit={(event) => {
        event.preventDefault();
        void save(form.filled);
      }}
    >
      <div className="max-w-prose">
        <TextInput
          label="Who says so"
          hint="Kept with every line you save: the earlier owner’s log, an invoice, a person."
          id="note"
          maxLength={500}
          value={form.note}
          error={form.noteError}
          onChange={(event) => form.setNote(event.target.value)}
        />
      </div>
      <ul className="grid">
        {standing.items.map((duty) => (
          <BaselineRow
            key={duty.ruleId}
            duty={duty}
            today={standing.today}
            draft={form.draftOf(duty.ruleId)}
            errors={form.errors[duty.ruleId] ?? {}}
            busy={form.busy}
            onChange={(part) => form.change(duty.ruleId, part)}
            onSave={() => void save([duty.ruleId])}
          />
        ))}
      </ul>
      <div>
        <Button
          type="submit"
          kind="primary"
          size="large"
          busy={form.busy}
          disabled={form.filled.length === 0}
        >
          Save all that are filled in
        </Button>
      </div>
    </form>
  );
}
