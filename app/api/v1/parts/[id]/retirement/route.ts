import { retirePart } from '@/lib/actions/retire-part';
import { handle } from '@/lib/http/handle';
import { idParams } from '@/lib/schemas/common';

export const POST = handle({ params: idParams }, (ctx, { params }) => retirePart(ctx, params.id));
