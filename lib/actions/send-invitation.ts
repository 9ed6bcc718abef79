import type { InvitationRow } from '@/db/queries/invitations';
import { findOperator } from '@/db/queries/operator';
import type { Context } from '@/lib/context';
import { linkTo } from '@/lib/links';
import { queueMail } from './queue-mail';
import { instantInWords, writeLetter } from './write-letter';

const ROLE_WORDS = { manager: 'a manager', mechanic: 'a mechanic', dock: 'dock staff' } as const;

/** Queues the letter that carries an invitation's token, in the caller's transaction. */
export async function sendInvitation(ctx: Context, invitation: InvitationRow, token: string): Promise<void> {
  const operator = (await findOperator(ctx.db))?.name ?? 'Wakewright';
  const inviter = ctx.actor.kind === 'person' ? ctx.actor.name : operator;
  const letter = writeLetter({
    kind: 'invitation',
    to: invitation.email,
    subject: `Invitation to ${operator} on Wakewright`,
    before: [
      `Hello ${invitation.name},`,
      `${inviter} invites you to Wakewright as ${ROLE_WORDS[invitation.role]} of ${operator}. Choose a password and you are in.`,
    ],
    link: { label: 'Accept the invitation', href: linkTo(`/invitation/${token}`) },
    after: [
      `The link works once, until ${instantInWords(invitation.expires_at)}.`,
      'If you did not expect this, do nothing: without the link nobody gets in.',
    ],
  });
  await queueMail(ctx, letter);
}
