import { changeRule } from '@/lib/actions/change-rule';
import { getRule } from '@/lib/actions/get-rule';
import { handle } from '@/lib/http/handle';
import { idParams } from '@/lib/schemas/common';
import { changeRule as changeRuleInput } from '@/lib/schemas/rule';

export const GET = handle({ params: idParams }, (ctx, { params }) => getRule(ctx, params.id));

export const PUT = handle({ params: idParams, body: changeRuleInput }, (ctx, { params, body }) =>
  changeRule(ctx, params.id, body),
);
