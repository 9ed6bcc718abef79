import { changeModel } from '@/lib/actions/change-model';
import { getModel } from '@/lib/actions/get-model';
import { handle } from '@/lib/http/handle';
import { idParams } from '@/lib/schemas/common';
import { changeModel as changeModelInput } from '@/lib/schemas/model';

export const GET = handle({ params: idParams }, (ctx, { params }) => getModel(ctx, params.id));

export const PATCH = handle({ params: idParams, body: changeModelInput }, (ctx, { params, body }) =>
  changeModel(ctx, params.id, body),
);
