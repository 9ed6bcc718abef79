import { sayNeed } from '@/lib/actions/say-need';
import { handle } from '@/lib/http/handle';
import { idParams } from '@/lib/schemas/common';
import { sayNeed as sayNeedInput } from '@/lib/schemas/task-parts';

export const PUT = handle({ params: idParams, body: sayNeedInput }, (ctx, { params, body }) =>
  sayNeed(ctx, params.id, body),
);
