'use client';

import { useState } from 'react';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import { Tag } from '@/components/ui/Tag';
import { TextInput } from '@/components/ui/TextInput';
import { instantText } from '@/components/ui/time-text';
import type { Failure } from '@/lib/client/api';
import { entryId, forgetEntry } from '@/lib/client/entry-id';
import type { SignOff } from '@/lib/schemas/work';
import { useSharedWork } from './WorkProvider';

type Kind = SignOff['kind'];
const KINDS: Record<Kind, { title: string; lead: string; button: string }> = {
  test_ride: {
    title: 'Test ride',
    lead: 'Whoever rode it signs: clean pick-up through the whole throttle range. Cut-off lanyard on, life jacket on.',
    button: 'I rode it, sign',
  },
  second_person: {
    title: 'Second person',
    lead: 'Somebody who did none of this work looks at all of it and signs. Entries made later want a new signature.',
    button: 'I looked at all of it, sign',
  },
};

/** The signatures that the task's rule asks for, each by name and time. */
export function SignOffs() {
  const { work, mayWork, me } = useSharedWork();
  const kinds = (['test_ride', 'second_person'] as const).filter(
    (kind) =>
      (kind === 'test_ride' ? work.wants.testRide : work.wants.secondPerson) ||
      work.signOffs.some((one) => one.kind === kind),
  );
  if (kinds.length === 0) return null;
  return (
    <section className="grid gap-4" aria-labelledby="signatures">
      <h2 id="signatures" className="text-2xl">
        Signatures
      </h2>
      {kinds.map((kind) => (
        <Signature key={`${kind}:${me.id}`} kind={kind} mayWork={mayWork} />
      ))}
    </section>
  );
}

function Signature({ kind, mayWork }: { kind: Kind; mayWork: boolean }) {
  const { work, act, waiting, timeZone } = useSharedWork();
  const [note, setNote] = useState('');
  const [busy, setBusy] = useState(false);
  const [failure, setFailure] = useState<Failure | null>(null);
  const signed = work.signOffs.find((one) => one.kind === kind);
  const { title, lead, button } = KINDS[kind];
  const what = `sign-off:${work.taskId}:${kind}`;
  async function run(action: () => Promise<Failure | null>): Promise<void> {
    setBusy(true);
    const refusal = await action();
    setBusy(false);
    setFailure(refusal);
    if (!refusal || refusal.code !== 'connection_lost') forgetEntry(what);
  }
  const sign = () =>
    act('POST', 'sign-offs', { id: entryId(what), kind, ...(note.trim() && { note: note.trim() }) });
  return (
    <div className="grid gap-3 border-t-2 border-edge pt-3">
      <h3 className="flex flex-wrap items-center gap-3 text-lg">
        {title}
        {signed?.stands ? (
          <Tag tone="ok">✓ Signed</Tag>
        ) : (
          <Tag tone="warn">{signed ? 'To be signed again' : 'Not signed yet'}</Tag>
        )}
      </h3>
      {signed ? (
        <p>
          {signed.signedBy.name}, {instantText(new Date(signed.signedAt), timeZone)}
          {signed.note ? `: ${signed.note}` : ''}
        </p>
      ) : null}
      {mayWork && !signed?.stands ? (
        <>
          <p className="text-ink-soft">{lead}</p>
          <TextInput
            label="Remark"
            optional
            maxLength={500}
            value={note}
            onChange={(event) => setNote(event.target.value)}
          />
          <div>
            <Button busy={busy} disabled={waiting.length > 0} onClick={() => void run(sign)}>
              {button}
            </Button>
          </div>
        </>
      ) : null}
      {mayWork && signed ? (
        <div>
          <Button
            kind="quiet"
            busy={busy}
            onClick={() => void run(() => act('DELETE', `sign-offs/${signed.id}`))}
          >
            Take the signature back
          </Button>
        </div>
      ) : null}
      {failure ? <Notice tone="danger">{failure.detail}</Notice> : null}
    </div>
  );
}
