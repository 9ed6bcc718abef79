import { getAvailability } from '@/lib/actions/get-availability';
import { handle } from '@/lib/http/handle';
import { availabilityQuery } from '@/lib/schemas/availability';

export const GET = handle({ query: availabilityQuery }, (ctx, { query }) => getAvailability(ctx, query));
