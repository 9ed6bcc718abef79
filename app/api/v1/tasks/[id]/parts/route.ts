import { getTaskParts } from '@/lib/actions/get-task-parts';
import { handle } from '@/lib/http/handle';
import { idParams } from '@/lib/schemas/common';

export const GET = handle({ params: idParams }, (ctx, { params }) => getTaskParts(ctx, params.id));
