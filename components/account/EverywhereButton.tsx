'use client';

import { Button } from '@/components/ui/Button';
import { FieldError } from '@/components/ui/Field';
import { send } from '@/lib/client/api';
import { goTo } from '@/lib/client/go-to';
import { useSend } from '@/lib/client/use-send';

/** Ends every session of one's own, this one too. */
export function EverywhereButton() {
  const { busy, failure, run } = useSend();
  async function leave() {
    const done = await run(() => send('DELETE', '/api/v1/account/sessions'));
    if (done) goTo('/sign-in?after=sign-out');
  }
  return (
    <div className="grid justify-items-start gap-2">
      <Button busy={busy} onClick={() => void leave()}>
        Sign out everywhere
      </Button>
      {failure ? <FieldError id="everywhere">{failure.detail}</FieldError> : null}
    </div>
  );
}
