'use client';

import { useRouter } from 'next/navigation';
import { Button } from '@/components/ui/Button';
import { FieldError } from '@/components/ui/Field';
import { useToast } from '@/components/ui/Toast';
import { send, type Answer } from '@/lib/client/api';
import { useSend } from '@/lib/client/use-send';
import type { Invitation } from '@/lib/schemas/invitation';

/** Sends an open invitation again, or withdraws it. */
export function InvitationButtons({ invitation }: { invitation: Invitation }) {
  const router = useRouter();
  const toast = useToast();
  const { busy, failure, run } = useSend();
  const path = `/api/v1/invitations/${invitation.id}`;
  async function carryOut(work: () => Promise<Answer<unknown>>, text: string) {
    if (await run(work)) toast({ text });
    router.refresh();
  }
  return (
    <div className="grid gap-2">
      <div className="flex flex-wrap gap-2">
        <Button
          busy={busy}
          aria-label={`Send the invitation to ${invitation.name} again`}
          onClick={() =>
            void carryOut(
              () => send('POST', `${path}/letters`),
              `A new link is on its way to ${invitation.email}.`,
            )
          }
        >
          Send again
        </Button>
        <Button
          busy={busy}
          aria-label={`Withdraw the invitation to ${invitation.name}`}
          onClick={() =>
            void carryOut(() => send('DELETE', path), `The invitation to ${invitation.email} is withdrawn.`)
          }
        >
          Withdraw
        </Button>
      </div>
      {failure ? <FieldError id={`invitation-${invitation.id}`}>{failure.detail}</FieldError> : null}
    </div>
  );
}
