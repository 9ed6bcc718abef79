'use client';

import { useRouter } from 'next/navigation';
import { useState, type FormEvent } from 'react';
import { Button } from '@/components/ui/Button';
import { ErrorSummary } from '@/components/ui/ErrorSummary';
import { NumberInput } from '@/components/ui/NumberInput';
import { namedOptions } from '@/components/ui/options';
import { RadioGroup } from '@/components/ui/RadioGroup';
import { Select } from '@/components/ui/Select';
import { TextInput } from '@/components/ui/TextInput';
import { useToast } from '@/components/ui/Toast';
import { fieldError, send } from '@/lib/client/api';
import { entryId, forgetEntry } from '@/lib/client/entry-id';
import { listErrors } from '@/lib/client/list-errors';
import { useSend } from '@/lib/client/use-send';
import type { Part } from '@/lib/schemas/part';
import { ACTS, actsFor, type Act } from './stock-acts';

const LABELS = { dockId: 'Dock', toDockId: 'To', quantity: 'How many', lowAt: 'Low from', reason: 'Why' };

/** Receives, counts and moves a part, makes kits up and breaks them up, and sets the low mark, at one of `docks`. */
export function StockForm({ part, docks }: { part: Part; docks: { id: string; name: string }[] }) {
  const router = useRouter();
  const toast = useToast();
  const { busy, failure, run, forget } = useSend();
  const [act, setAct] = useState<Act>('receive');
  const [dockId, setDockId] = useState(docks[0]?.id ?? '');
  const [toDockId, setToDockId] = useState('');
  const [quantity, setQuantity] = useState('');
  const [reason, setReason] = useState('');
  const { button, done, amount, hint } = ACTS[act];
  const level = part.levels.find((one) => one.dockId === dockId);
  const what = ['stock', part.id, act, dockId, toDockId, quantity, level?.onHand ?? 0].join(' ');

  async function submit(event: FormEvent): Promise<void> {
    event.preventDefault();
    const count = /^\d+$/.test(quantity.trim()) ? Number(quantity) : quantity.trim() || undefined;
    const body = {
      ...{ id: entryId(what), kind: act, partId: part.id, dockId, quantity: count },
      ...(act === 'move' && toDockId && { toDockId }),
      ...(reason.trim() && { reason }),
    };
    const answer = await run<unknown>(() =>
      act === 'low'
        ? send('PUT', `/api/v1/parts/${part.id}/low-mark`, { dockId, lowAt: count ?? null })
        : send('POST', '/api/v1/stock-moves', body),
    );
    if (!answer) return;
    forgetEntry(what);
    setQuantity('');
    setReason('');
    toast({ text: `${part.name}: ${done}.` });
    router.refresh();
  }

  return (
    <form noValidate className="grid gap-4" onSubmit={(event) => void submit(event)}>
      <ErrorSummary errors={listErrors(failure, LABELS)} title="Nothing was moved" />
      <RadioGroup
        label="What"
        name="act"
        look="segmented"
        options={actsFor(part, docks.length).map((value) => ({ value, label: ACTS[value].label }))}
        value={act}
        onChange={(event) => {
          setAct(event.target.value as Act);
          forget();
        }}
      />
      <Select
        label={act === 'move' ? 'From' : 'Dock'}
        id="dockId"
        options={namedOptions(docks)}
        value={dockId}
        hint={`${level?.onHand ?? 0} on hand, ${level?.free ?? 0} of them free.`}
        error={fieldError(failure, 'dockId')}
        onChange={(event) => setDockId(event.target.value)}
      />
      {act === 'move' ? (
        <Select
          label="To"
          id="toDockId"
          placeholder="Choose a dock"
          options={namedOptions(docks.filter(({ id }) => id !== dockId))}
          value={toDockId}
          error={fieldError(failure, 'toDockId')}
          onChange={(event) => setToDockId(event.target.value)}
        />
      ) : null}
      <NumberInput
        label={amount}
        id={act === 'low' ? 'lowAt' : 'quantity'}
        whole
        large
        hint={hint}
        value={quantity}
        error={fieldError(failure, act === 'low' ? 'lowAt' : 'quantity')}
        onChange={(event) => setQuantity(event.target.value)}
      />
      {act === 'low' ? null : (
        <TextInput
          label="Why"
          id="reason"
          optional
          maxLength={300}
          value={reason}
          error={fieldError(failure, 'reason')}
          onChange={(event) => setReason(event.target.value)}
        />
      )}
      <div>
        <Button type="submit" kind="primary" size="large" busy={busy}>
          {button}
        </Button>
      </div>
    </form>
  );
}
