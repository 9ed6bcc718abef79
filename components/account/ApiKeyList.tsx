'use client';

import { useRouter } from 'next/navigation';
import { Button } from '@/components/ui/Button';
import { FieldError } from '@/components/ui/Field';
import { Timestamp } from '@/components/ui/Timestamp';
import { send } from '@/lib/client/api';
import { useSend } from '@/lib/client/use-send';
import type { ApiKey } from '@/lib/schemas/api-key';

/** The keys that work, each with a way to end it. */
export function ApiKeyList({ keys, now }: { keys: ApiKey[]; now: string }) {
  const router = useRouter();
  const { busy, failure, run } = useSend();
  async function revoke(key: ApiKey) {
    await run(() => send('DELETE', `/api/v1/api-keys/${key.id}`));
    router.refresh();
  }
  if (keys.length === 0) return <p className="text-ink-soft">You have no API keys.</p>;
  return (
    <>
      {failure ? <FieldError id="api-keys">{failure.detail}</FieldError> : null}
      <ul className="grid border-t border-hairline">
        {keys.map((key) => (
          <li
            key={key.id}
            className="flex flex-wrap items-center justify-between gap-3 border-b border-hairline py-2"
          >
            <div className="min-w-0">
              <p className="font-semibold break-words">{key.name}</p>
              <p className="text-ink-soft">
                <span className="numerals">{key.prefix}…</span> ·{' '}
                {key.lastUsedAt ? (
                  <>
                    last used <Timestamp at={key.lastUsedAt} now={now} timeZone="UTC" />
                  </>
                ) : (
                  'never used'
                )}
              </p>
            </div>
            <Button busy={busy} aria-label={`Revoke ${key.name}`} onClick={() => void revoke(key)}>
              Revoke
            </Button>
          </li>
        ))}
      </ul>
    </>
  );
}
