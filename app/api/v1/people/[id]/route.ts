import { changePerson } from '@/lib/actions/change-person';
import { getPerson } from '@/lib/actions/get-person';
import { handle } from '@/lib/http/handle';
import { idParams } from '@/lib/schemas/common';
import { changePerson as changePersonInput } from '@/lib/schemas/person';

export const GET = handle({ params: idParams }, (ctx, { params }) => getPerson(ctx, params));

export const PATCH = handle({ params: idParams, body: changePersonInput }, (ctx, { params, body }) =>
  changePerson(ctx, { ...body, ...params }),
);
