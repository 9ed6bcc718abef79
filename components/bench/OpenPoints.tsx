'use client';

import { Notice } from '@/components/ui/Notice';
import { countOf } from '@/lib/domain/words';
import { spotId } from './BenchStep';
import { useSharedWork } from './WorkProvider';

const SHOWN = 12;

/** What is still open before the task can be closed, each leading to its place. */
export function OpenPoints() {
  const { faults, waiting, refused } = useSharedWork();
  const unsent = waiting.length + refused.length;
  if (faults.length === 0 && unsent === 0)
    return <Notice tone="ok" title="Everything that was asked for is in." still />;
  return (
    <Notice tone="info" title={`${countOf(faults.length + (unsent > 0 ? 1 : 0), 'thing')} still open`} still>
      <ul className="grid gap-1">
        {unsent > 0 ? <li>Entries on this device have not reached the server.</li> : null}
        {faults.slice(0, SHOWN).map((fault) => (
          <li key={`${fault.on}:${fault.stepKey}:${fault.place}`}>
            {fault.stepKey ? (
              <a
                className="link inline-flex min-h-target items-center"
                href={`#${spotId(fault.stepKey, fault.place)}`}
              >
                {fault.message}
              </a>
            ) : (
              fault.message
            )}
          </li>
        ))}
        {faults.length > SHOWN ? <li>And {faults.length - SHOWN} more.</li> : null}
      </ul>
    </Notice>
  );
}
