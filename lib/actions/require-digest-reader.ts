import type { Context } from '@/lib/context';
import type { PersonActor } from '@/lib/domain/access';
import { Refusal } from '@/lib/errors';
import { requireSomewhere } from './access';

/** The manager who asks. Throws `forbidden` for everybody whom the digest is not for. */
export function requireDigestReader(ctx: Context): PersonActor {
  requireSomewhere(ctx, 'digest.read');
  if (ctx.actor.kind !== 'person') throw new Refusal('forbidden', 'The digest is for a person.');
  return ctx.actor;
}
