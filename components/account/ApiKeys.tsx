'use client';

import { useRouter } from 'next/navigation';
import { useState, type FormEvent } from 'react';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import { TextInput } from '@/components/ui/TextInput';
import { fieldError, formError, send } from '@/lib/client/api';
import { textOf } from '@/lib/client/form-values';
import { useSend } from '@/lib/client/use-send';
import type { ApiKey, NewApiKey } from '@/lib/schemas/api-key';
import { ApiKeyList } from './ApiKeyList';

/** One's own API keys: made and shown once, listed by their beginning, revoked. */
export function ApiKeys({ keys, mayCreate, now }: { keys: ApiKey[]; mayCreate: boolean; now: string }) {
  const router = useRouter();
  const [made, setMade] = useState<NewApiKey | null>(null);
  const { busy, failure, run } = useSend();
  async function create(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const form = event.currentTarget;
    const body = { name: textOf(form, 'keyName') };
    const done = await run(() => send<NewApiKey>('POST', '/api/v1/api-keys', body));
    if (!done) return;
    setMade(done.data);
    form.reset();
    router.refresh();
  }
  const error = formError(failure, ['name']);
  return (
    <div className="grid max-w-3xl gap-5">
      {error ? <Notice tone="danger">{error}</Notice> : null}
      {made ? (
        <Notice tone="warn" title="Copy this key now: it is not shown again">
          <code className="numerals break-all select-all">{made.key}</code>
        </Notice>
      ) : null}
      <ApiKeyList keys={keys} now={now} />
      {mayCreate ? (
        <form onSubmit={(event) => void create(event)} noValidate className="grid max-w-xl gap-3">
          <TextInput
            name="keyName"
            label="Name of a new key"
            hint="What will use it. The key may do what you may do."
            autoComplete="off"
            error={fieldError(failure, 'name')}
          />
          <div>
            <Button type="submit" busy={busy}>
              Make a key
            </Button>
          </div>
        </form>
      ) : null}
    </div>
  );
}
