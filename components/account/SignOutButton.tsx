'use client';

import { Button } from '@/components/ui/Button';
import { FieldError } from '@/components/ui/Field';
import { goTo } from '@/lib/client/go-to';
import { signOut } from '@/lib/client/sign-in';
import { useSend } from '@/lib/client/use-send';

/** Ends this browser's session and goes to sign in. */
export function SignOutButton() {
  const { busy, failure, run } = useSend();
  async function leave() {
    if (await run(signOut)) goTo('/sign-in');
  }
  return (
    <div className="grid gap-2">
      <Button busy={busy} onClick={() => void leave()}>
        Sign out
      </Button>
      {failure ? <FieldError id="sign-out">{failure.detail}</FieldError> : null}
    </div>
  );
}
