import { endLayUp } from '@/lib/actions/end-lay-up';
import { handle } from '@/lib/http/handle';
import { idParams } from '@/lib/schemas/common';

export const POST = handle({ params: idParams, status: 201 }, (ctx, { params }) => endLayUp(ctx, params.id));
