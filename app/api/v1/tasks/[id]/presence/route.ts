import { seeAtTask } from '@/lib/actions/see-at-task';
import { handle } from '@/lib/http/handle';
import { idParams } from '@/lib/schemas/common';

export const POST = handle({ params: idParams }, (ctx, { params }) => seeAtTask(ctx, params.id));
