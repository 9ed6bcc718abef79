import { changeProcedure } from '@/lib/actions/change-procedure';
import { getProcedure } from '@/lib/actions/get-procedure';
import { handle } from '@/lib/http/handle';
import { idParams } from '@/lib/schemas/common';
import { changeProcedure as changeProcedureInput } from '@/lib/schemas/procedure';

export const GET = handle({ params: idParams }, (ctx, { params }) => getProcedure(ctx, params.id));

export const PUT = handle({ params: idParams, body: changeProcedureInput }, (ctx, { params, body }) =>
  changeProcedure(ctx, params.id, body),
);
