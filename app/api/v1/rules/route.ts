import { createRule } from '@/lib/actions/create-rule';
import { listRules } from '@/lib/actions/list-rules';
import { handle } from '@/lib/http/handle';
import { createRule as createRuleInput, rulesQuery } from '@/lib/schemas/rule';

export const GET = handle({ query: rulesQuery }, async (ctx, { query }) => ({
  items: await listRules(ctx, query),
  nextCursor: null,
}));

export const POST = handle({ body: createRuleInput, status: 201 }, (ctx, { body }) => createRule(ctx, body));
