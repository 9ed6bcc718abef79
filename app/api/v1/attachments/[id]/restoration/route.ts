import { restoreAttachment } from '@/lib/actions/remove-attachment';
import { handle } from '@/lib/http/handle';
import { idParams } from '@/lib/schemas/common';

export const POST = handle({ params: idParams }, (ctx, { params }) => restoreAttachment(ctx, params.id));
