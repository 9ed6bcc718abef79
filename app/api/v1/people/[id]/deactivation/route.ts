import { deactivatePerson } from '@/lib/actions/deactivate-person';
import { reactivatePerson } from '@/lib/actions/reactivate-person';
import { handle } from '@/lib/http/handle';
import { idParams } from '@/lib/schemas/common';

export const POST = handle({ params: idParams }, (ctx, { params }) => deactivatePerson(ctx, params));

export const DELETE = handle({ params: idParams }, (ctx, { params }) => reactivatePerson(ctx, params));
