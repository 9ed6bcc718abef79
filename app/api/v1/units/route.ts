import { createUnit } from '@/lib/actions/create-unit';
import { listUnits } from '@/lib/actions/list-units';
import { handle } from '@/lib/http/handle';
import { createUnit as createUnitInput, unitsQuery } from '@/lib/schemas/unit';

export const GET = handle({ query: unitsQuery }, (ctx, { query }) => listUnits(ctx, query));

export const POST = handle({ body: createUnitInput, status: 201 }, (ctx, { body }) => createUnit(ctx, body));
