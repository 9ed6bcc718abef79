'use client';

import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import { Tag } from '@/components/ui/Tag';
import { countOf } from '@/lib/domain/words';
import { useSharedWork } from './WorkProvider';

/** Whether all that was entered here has reached the server; what it would not have, and why. */
export function SaveState() {
  const { waiting, refused, reached, ready, sendNow, discard, work } = useSharedWork();
  const titleOf = (key: unknown) => work.steps.find((step) => step.key === key)?.title ?? 'an entry';
  return (
    <>
      <span role="status" className="flex flex-wrap items-center gap-3">
        {waiting.length > 0 ? (
          <>
            <Tag tone="warn">
              {countOf(waiting.length, 'entry').replace('entrys', 'entries')} kept on this device
            </Tag>
            <span className="text-ink-soft">Waiting for the network.</span>
            <Button onClick={sendNow}>Send now</Button>
          </>
        ) : !reached ? (
          <Tag tone="warn">No connection: what you enter is kept on this device</Tag>
        ) : ready ? (
          <Tag tone="ok">All saved</Tag>
        ) : null}
      </span>
      {refused
        .filter(({ file }) => !file)
        .map((entry) => (
          <Notice
            key={entry.order}
            tone="danger"
            title={`Not taken: ${String(titleOf(entry.body['stepKey']))}`}
            action={<Button onClick={() => discard(entry)}>Forget this entry</Button>}
          >
            {entry.refused?.detail}
          </Notice>
        ))}
    </>
  );
}
