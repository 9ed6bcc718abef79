import type { HoldShown } from '@/lib/schemas/availability';
import { instantText } from '@/components/ui/time-text';

/** Every reason why a unit is held, since when, and what lifts it. */
export function HoldList({ holds, timeZone }: { holds: readonly HoldShown[]; timeZone: string }) {
  return (
    <ul className="grid gap-2">
      {holds.map((hold) => (
        <li
          key={`${hold.reason} ${hold.ruleId ?? hold.defectId ?? hold.layUpId ?? ''} ${hold.text}`}
          className="border-l-4 border-held pl-3"
        >
          <p className="max-w-prose">{hold.text}</p>
          <p className="text-sm text-ink-soft">Since {instantText(new Date(hold.since), timeZone)}</p>
        </li>
      ))}
    </ul>
  );
}
