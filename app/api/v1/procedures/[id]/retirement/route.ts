import { retireProcedure } from '@/lib/actions/retire-procedure';
import { handle } from '@/lib/http/handle';
import { idParams } from '@/lib/schemas/common';

export const POST = handle({ params: idParams }, (ctx, { params }) => retireProcedure(ctx, params.id));
