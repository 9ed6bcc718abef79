import {
  claimMail,
  findMail,
  insertMailFailure,
  insertMailSent,
  releaseMailClaim,
  type MailRow,
} from '@/db/queries/mail';
import type { Context } from '@/lib/context';
import { keepMailClaim, type MailClaim } from './keep-mail-claim';

/** What a mail server made of a letter: it took it, it will never take it, or not now. */
export type Delivery = { outcome: 'sent' } | { outcome: 'refused' | 'not-now'; why: string };
/** Hands a letter to a mail server. Must ask `claim.holds()` at the last moment before the body goes out. */
export type Deliver = (letter: MailRow, claim: MailClaim) => Promise<Delivery>;

/** A letter that could not be sent for this long is given up. */
const GIVEN_UP_AFTER_MS = 3 * 86_400_000;

/**
 * Sends a letter, once: whoever sends it holds a claim on its row, renewed every `renewMs`, that ends `claimMs`
 * after it was last renewed. A letter that is sent or failed already is left alone. Throws when the letter is to
 * be tried again later, which includes one that another run has in hand: should that run end in the middle, this
 * job must still be there.
 */
export async function sendMail(
  ctx: Context,
  { mailId }: { mailId: string },
  { deliver, claimMs, renewMs }: { deliver: Deliver; claimMs: number; renewMs: number },
): Promise<void> {
  const claimId = crypto.randomUUID();
  const claimedAt = performance.now();
  const letter = await claimMail(ctx.db, { mailId, claimId, claimMs });
  if (!letter) return requireSettled(await findMail(ctx.db, mailId));
  const claim = keepMailClaim(ctx, { mailId, claimId, claimedAt, claimMs, renewMs });
  const delivery = await deliver(letter, claim).finally(() => claim.stop());
  if (delivery.outcome === 'sent') return insertMailSent(ctx.db, mailId, ctx.now);
  const tooOld = ctx.now.getTime() - letter.queued_at.getTime() > GIVEN_UP_AFTER_MS;
  if (delivery.outcome === 'refused' || tooOld) {
    return insertMailFailure(ctx.db, { mailId, claimId, why: delivery.why });
  }
  await releaseMailClaim(ctx.db, mailId, claimId);
  throw new Error(`letter ${mailId} was not sent: ${delivery.why}`);
}

function requireSettled(letter: MailRow | undefined): void {
  if (letter && !letter.sent_at && letter.failure === null) {
    throw new Error(`letter ${letter.id} is in the hands of another run`);
  }
}
