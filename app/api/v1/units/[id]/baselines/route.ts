import { listBaselines } from '@/lib/actions/list-baselines';
import { recordBaseline } from '@/lib/actions/record-baseline';
import { handle } from '@/lib/http/handle';
import { recordBaseline as recordBaselineInput } from '@/lib/schemas/baseline';
import { idParams } from '@/lib/schemas/common';

export const GET = handle({ params: idParams }, async (ctx, { params }) => ({
  items: await listBaselines(ctx, params.id),
  nextCursor: null,
}));

export const POST = handle(
  { params: idParams, body: recordBaselineInput, status: 201 },
  (ctx, { params, body }) => recordBaseline(ctx, params.id, body),
);
