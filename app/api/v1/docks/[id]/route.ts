import { changeDock } from '@/lib/actions/change-dock';
import { getDock } from '@/lib/actions/get-dock';
import { handle } from '@/lib/http/handle';
import { idParams } from '@/lib/schemas/common';
import { changeDock as changeDockInput } from '@/lib/schemas/dock';

export const GET = handle({ params: idParams }, (ctx, { params }) => getDock(ctx, params.id));

export const PATCH = handle({ params: idParams, body: changeDockInput }, (ctx, { params, body }) =>
  changeDock(ctx, params.id, body),
);
