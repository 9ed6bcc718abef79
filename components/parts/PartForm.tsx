'use client';

import { useRouter } from 'next/navigation';
import { useState, type FormEvent } from 'react';
import { Button } from '@/components/ui/Button';
import { Checkbox } from '@/components/ui/Checkbox';
import { ErrorSummary } from '@/components/ui/ErrorSummary';
import { LinkButton } from '@/components/ui/LinkButton';
import { TextInput } from '@/components/ui/TextInput';
import { useToast } from '@/components/ui/Toast';
import { fieldError, send } from '@/lib/client/api';
import { entryId, forgetEntry } from '@/lib/client/entry-id';
import { textOf } from '@/lib/client/form-values';
import { listErrors } from '@/lib/client/list-errors';
import { useSend } from '@/lib/client/use-send';
import type { Part, PartLine } from '@/lib/schemas/part';
import { ContentRows, type ContentDraft } from './ContentRows';
import { partOptions } from './part-words';

const LABELS = { number: 'Number', name: 'Name', supplier: 'Supplier' };

/** Adds a part or a kit, or changes one. `parts` are those that a kit may hold. */
export function PartForm({ part, parts }: { part: Part | null; parts: PartLine[] }) {
  const router = useRouter();
  const toast = useToast();
  const { busy, failure, run } = useSend();
  const [left, setLeft] = useState(false);
  const [isKit, setIsKit] = useState(part?.isKit ?? false);
  const [rows, setRows] = useState<ContentDraft[]>(
    (part?.contents ?? []).map(({ partId, quantity }, key) => ({ key, partId, quantity: String(quantity) })),
  );

  async function submit(event: FormEvent<HTMLFormElement>): Promise<void> {
    event.preventDefault();
    const form = event.currentTarget;
    const body = {
      number: textOf(form, 'number'),
      name: textOf(form, 'name'),
      supplier: textOf(form, 'supplier') || null,
      ...(isKit && {
        contents: rows.map(({ partId, quantity }) => ({ partId, quantity: wholeOf(quantity) })),
      }),
    };
    const answer = await run(() =>
      part
        ? send<Part>('PATCH', `/api/v1/parts/${part.id}`, body)
        : send<Part>('POST', '/api/v1/parts', { id: entryId('part'), ...body }),
    );
    if (!answer) return;
    forgetEntry('part');
    setLeft(true);
    toast({ text: `${answer.data.name} is saved.` });
    router.push(`/parts/${answer.data.id}`);
    router.refresh();
  }

  const field = (name: keyof typeof LABELS, value: string | null | undefined, optional = false) => (
    <TextInput
      name={name}
      label={LABELS[name]}
      maxLength={name === 'number' ? 40 : 120}
      optional={optional}
      defaultValue={value ?? ''}
      error={fieldError(failure, name)}
    />
  );
  return (
    <form noValidate className="grid max-w-3xl gap-6" onSubmit={(event) => void submit(event)}>
      <ErrorSummary errors={listErrors(failure, LABELS)} title="The part is not saved" />
      {field('name', part?.name)}
      {field('number', part?.number)}
      {field('supplier', part?.supplier, true)}
      {part ? null : (
        <Checkbox
          label="It is a kit of other parts"
          name="isKit"
          checked={isKit}
          onChange={(event) => setIsKit(event.target.checked)}
        />
      )}
      {isKit ? (
        <ContentRows
          rows={rows}
          options={partOptions(parts.filter((one) => !one.isKit))}
          error={(path) => fieldError(failure, path)}
          onChange={setRows}
        />
      ) : null}
      <div className="flex flex-wrap gap-3 border-t-2 border-line pt-4">
        <Button type="submit" kind="primary" size="large" busy={busy || left}>
          {part ? 'Save' : isKit ? 'Add the kit' : 'Add the part'}
        </Button>
        <LinkButton kind="quiet" size="large" href={part ? `/parts/${part.id}` : '/parts'}>
          Cancel
        </LinkButton>
      </div>
    </form>
  );
}

const wholeOf = (text: string) => (/^\d+$/.test(text.trim()) ? Number(text) : text);
