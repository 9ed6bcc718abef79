'use client';

import type { ReactNode } from 'react';
import { instantText } from '@/components/ui/time-text';
import { entriesAt, type BenchEntry, type Spot } from './bench-entries';
import { describeValue } from '@/lib/domain/entry-words';
import { useSharedWork } from './WorkProvider';

/** Who entered what stands at a spot, and what stood there before: nothing is lost. */
export function EntryTrail({ spot, children }: { spot: Spot; children?: ReactNode }) {
  const { entries, overtaken, timeZone } = useSharedWork();
  const here = entriesAt(entries, spot);
  const latest = here.at(-1);
  if (!latest) return null;
  const earlier = here.slice(0, -1).reverse();
  const line = ({ enteredBy, enteredAt }: BenchEntry) =>
    `${enteredBy?.name ?? 'The system'}, ${instantText(new Date(enteredAt), timeZone)}`;
  const met = overtaken.filter(({ id }) => here.some((entry) => entry.id === id));
  return (
    <div className="grid gap-1 text-sm">
      <div className="flex flex-wrap items-center gap-x-3">
        <span className="text-ink-soft">
          {latest.waiting ? 'Kept on this device, not sent yet.' : `${line(latest)}.`}
        </span>
        {children}
      </div>
      {met.map(({ id, overtook }) => (
        <p key={id} role="status" className="font-semibold text-warn">
          {overtook.enteredBy?.name ?? 'Somebody'} had entered {describeValue(overtook.value)} in the
          meantime. Both are kept; the later one stands.
        </p>
      ))}
      {earlier.length > 0 ? (
        <details>
          <summary className="inline-flex min-h-target cursor-pointer items-center text-line underline underline-offset-4">
            Before that ({earlier.length})
          </summary>
          <ul className="grid gap-1 pt-1">
            {earlier.map((entry) => (
              <li key={entry.id}>
                <span className="font-semibold">{describeValue(entry.value)}</span>{' '}
                <span className="text-ink-soft">{line(entry)}</span>
              </li>
            ))}
          </ul>
        </details>
      ) : null}
    </div>
  );
}
