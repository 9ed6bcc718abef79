import { instantText } from '@/components/ui/time-text';
import type { Failure } from '@/lib/client/api';

/** When the list was read, or that it can no longer be read. */
export function AsOf({ at, failure, timeZone }: { at: string; failure: Failure | null; timeZone: string }) {
  const shown = <time dateTime={at}>{instantText(new Date(at), timeZone)}</time>;
  return failure ? (
    <p role="alert" className="border-l-8 border-warn bg-warn-tint px-4 py-2 font-semibold text-warn">
      {failure.detail} This is how it stood on {shown}.
    </p>
  ) : (
    <p className="text-ink-soft">As of {shown}, kept up to date.</p>
  );
}
