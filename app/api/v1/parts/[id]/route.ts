import { changePart } from '@/lib/actions/change-part';
import { getPart } from '@/lib/actions/get-part';
import { handle } from '@/lib/http/handle';
import { idParams } from '@/lib/schemas/common';
import { changePart as changePartInput } from '@/lib/schemas/part';

export const GET = handle({ params: idParams }, (ctx, { params }) => getPart(ctx, params.id));

export const PATCH = handle({ params: idParams, body: changePartInput }, (ctx, { params, body }) =>
  changePart(ctx, params.id, body),
);
