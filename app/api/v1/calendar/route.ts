import { getCalendar } from '@/lib/actions/get-calendar';
import { handle } from '@/lib/http/handle';
import { calendarQuery } from '@/lib/schemas/calendar';

export const GET = handle({ query: calendarQuery }, (ctx, { query }) => getCalendar(ctx, query));
