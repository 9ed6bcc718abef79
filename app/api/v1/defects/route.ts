import { listDefects } from '@/lib/actions/list-defects';
import { reportDefect } from '@/lib/actions/report-defect';
import { handle } from '@/lib/http/handle';
import { createDefect, defectsQuery } from '@/lib/schemas/defect';

export const GET = handle({ query: defectsQuery }, (ctx, { query }) => listDefects(ctx, query));

export const POST = handle({ body: createDefect, status: 201 }, (ctx, { body }) => reportDefect(ctx, body));
