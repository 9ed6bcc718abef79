'use client';

import { useRouter } from 'next/navigation';
import { useState, type FormEvent } from 'react';
import { Button } from '@/components/ui/Button';
import { Checkbox } from '@/components/ui/Checkbox';
import { ErrorSummary } from '@/components/ui/ErrorSummary';
import { RadioGroup } from '@/components/ui/RadioGroup';
import { Select, type SelectOption } from '@/components/ui/Select';
import { Textarea } from '@/components/ui/Textarea';
import { TextInput } from '@/components/ui/TextInput';
import { fieldError, send } from '@/lib/client/api';
import { useSend } from '@/lib/client/use-send';
import { AD_HOC_KINDS, type TaskPage } from '@/lib/schemas/task';
import { kindWords } from './task-words';

/** Opens a task on a unit; a repair may hold it. */
export function NewTaskForm({
  units,
  unitId,
  procedures,
}: {
  units: SelectOption[];
  unitId: string;
  procedures: SelectOption[];
}) {
  const { busy, failure, run } = useSend();
  const [kind, setKind] = useState<string>('repair');
  const router = useRouter();
  async function submit(event: FormEvent<HTMLFormElement>): Promise<void> {
    event.preventDefault();
    const given = new FormData(event.currentTarget);
    const text = (name: string) => String(given.get(name) ?? '').trim();
    const body = {
      unitId: text('unitId'),
      kind,
      title: text('title'),
      ...(text('detail') && { detail: text('detail') }),
      ...(text('procedureId') && { procedureId: text('procedureId') }),
      ...(text('plannedOn') && { plannedOn: text('plannedOn') }),
      ...(kind === 'repair' && { holdsUnit: given.get('holdsUnit') !== null }),
    };
    const done = await run(() => send<TaskPage>('POST', '/api/v1/tasks', body));
    if (done) router.push(`/tasks/${done.data.id}`);
  }
  const error = (path: string) => fieldError(failure, path);
  const issues = failure
    ? failure.errors.length > 0
      ? [...failure.errors]
      : [{ path: '', message: failure.detail }]
    : [];
  return (
    <form onSubmit={(event) => void submit(event)} noValidate className="grid max-w-prose gap-5">
      <ErrorSummary errors={issues} />
      <Select
        name="unitId"
        label="Unit"
        placeholder="Choose a unit"
        options={units}
        defaultValue={unitId}
        error={error('unitId')}
      />
      <RadioGroup
        name="kind"
        label="Kind"
        look="segmented"
        options={AD_HOC_KINDS.map((value) => ({ value, label: kindWords[value] }))}
        value={kind}
        error={error('kind')}
        onChange={(event) => setKind(event.target.value)}
      />
      <TextInput name="title" label="What is to be done" maxLength={120} error={error('title')} />
      <Textarea name="detail" label="Details" optional rows={4} error={error('detail')} />
      <Select
        name="procedureId"
        label="Procedure"
        optional
        placeholder="None"
        options={procedures}
        error={error('procedureId')}
      />
      <TextInput name="plannedOn" type="date" label="Plan for" optional error={error('plannedOn')} />
      {kind === 'repair' ? (
        <Checkbox
          name="holdsUnit"
          label="Hold the unit until this is done"
          hint="It goes off the list of what may be launched at once."
          error={error('holdsUnit')}
        />
      ) : null}
      <div>
        <Button type="submit" kind="primary" size="large" busy={busy}>
          Open task
        </Button>
      </div>
    </form>
  );
}
