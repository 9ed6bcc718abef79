import { listDuePoints } from '@/lib/actions/list-due-points';
import { handle } from '@/lib/http/handle';
import { idParams } from '@/lib/schemas/common';

export const GET = handle({ params: idParams }, (ctx, { params }) => listDuePoints(ctx, params.id));
