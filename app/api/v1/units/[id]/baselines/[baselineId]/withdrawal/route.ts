import { withdrawBaseline } from '@/lib/actions/withdraw-baseline';
import { handle } from '@/lib/http/handle';
import { baselineParams } from '@/lib/schemas/baseline';

export const POST = handle({ params: baselineParams }, (ctx, { params }) =>
  withdrawBaseline(ctx, params.id, params.baselineId),
);
