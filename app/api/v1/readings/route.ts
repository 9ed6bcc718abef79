import { listReadings } from '@/lib/actions/list-readings';
import { logReading } from '@/lib/actions/log-reading';
import { handle } from '@/lib/http/handle';
import { createReading, readingsQuery } from '@/lib/schemas/reading';

export const GET = handle({ query: readingsQuery }, (ctx, { query }) => listReadings(ctx, query));

export const POST = handle({ body: createReading, status: 201 }, (ctx, { body }) => logReading(ctx, body));
