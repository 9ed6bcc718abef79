import { changeUnit } from '@/lib/actions/change-unit';
import { getUnit } from '@/lib/actions/get-unit';
import { handle } from '@/lib/http/handle';
import { idParams } from '@/lib/schemas/common';
import { changeUnit as changeUnitInput } from '@/lib/schemas/unit';

export const GET = handle({ params: idParams }, (ctx, { params }) => getUnit(ctx, params.id));

export const PATCH = handle({ params: idParams, body: changeUnitInput }, (ctx, { params, body }) =>
  changeUnit(ctx, params.id, body),
);
