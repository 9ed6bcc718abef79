import { getWork } from '@/lib/actions/get-work';
import { handle } from '@/lib/http/handle';
import { idParams } from '@/lib/schemas/common';

export const GET = handle({ params: idParams }, (ctx, { params }) => getWork(ctx, params.id));
