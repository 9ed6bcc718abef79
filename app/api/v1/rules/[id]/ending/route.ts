import { endRule } from '@/lib/actions/end-rule';
import { reopenRule } from '@/lib/actions/reopen-rule';
import { handle } from '@/lib/http/handle';
import { idParams } from '@/lib/schemas/common';
import { endRule as endRuleInput } from '@/lib/schemas/rule';

export const POST = handle({ params: idParams, body: endRuleInput }, (ctx, { params, body }) =>
  endRule(ctx, params.id, body),
);

export const DELETE = handle({ params: idParams }, (ctx, { params }) => reopenRule(ctx, params.id));
