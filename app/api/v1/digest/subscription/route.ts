import { setDigestWanted } from '@/lib/actions/set-digest-wanted';
import { handle } from '@/lib/http/handle';
import { digestSubscription } from '@/lib/schemas/digest';

export const PUT = handle({ body: digestSubscription }, (ctx, { body }) => setDigestWanted(ctx, body));
