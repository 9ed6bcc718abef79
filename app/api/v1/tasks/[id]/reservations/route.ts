import { releaseParts } from '@/lib/actions/release-parts';
import { reserveParts } from '@/lib/actions/reserve-parts';
import { setReservation } from '@/lib/actions/set-reservation';
import { handle } from '@/lib/http/handle';
import { idParams } from '@/lib/schemas/common';
import { setReservation as setReservationInput } from '@/lib/schemas/task-parts';

export const POST = handle({ params: idParams }, (ctx, { params }) => reserveParts(ctx, params.id));

export const PUT = handle({ params: idParams, body: setReservationInput }, (ctx, { params, body }) =>
  setReservation(ctx, params.id, body),
);

export const DELETE = handle({ params: idParams }, (ctx, { params }) => releaseParts(ctx, params.id));
