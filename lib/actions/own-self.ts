import type { Context } from '@/lib/context';
import type { PersonActor } from '@/lib/domain/access';
import { Refusal } from '@/lib/errors';

/**
 * The person who asks, for what concerns themselves. Throws `forbidden` for the system, and for an API key when
 * `signedIn`: a key that leaked must not be able to make itself at home.
 */
export function ownSelf(ctx: Context, { signedIn = false } = {}): PersonActor {
  if (ctx.actor.kind !== 'person') throw new Refusal('forbidden', 'Only a person has an account.');
  if (signedIn && ctx.actor.sessionId === null) {
    throw new Refusal('forbidden', 'Sign in to do this: an API key may not.');
  }
  return ctx.actor;
}
