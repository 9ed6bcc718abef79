import { previewRule } from '@/lib/actions/preview-rule';
import { handle } from '@/lib/http/handle';
import { previewRule as previewRuleInput } from '@/lib/schemas/rule';

export const POST = handle({ body: previewRuleInput }, (ctx, { body }) => previewRule(ctx, body));
