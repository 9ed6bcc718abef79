import { endOwnSessions } from '@/lib/actions/end-own-sessions';
import { handle } from '@/lib/http/handle';
import { noContent } from '@/lib/http/no-content';

export const DELETE = handle({}, async (ctx) => {
  await endOwnSessions(ctx);
  return noContent();
});
