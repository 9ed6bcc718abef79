import { writeCursor } from '@/lib/schemas/cursor';
import { pageAfter } from './page-after';

/**
 * A page of a list that is ordered as a whole at each call, because its order follows from what is computed: what
 * comes after the cursor's place, up to `limit`. Throws `invalid_input` on `cursor` for one no list answered.
 */
export function pageByPlace<T, Place extends object>(
  items: readonly T[],
  by: {
    schema: Parameters<typeof pageAfter>[0];
    placeOf: (item: T) => Place;
    compare: (a: Place, b: Place) => number;
    cursor: string | undefined;
    limit: number;
  },
): { items: T[]; nextCursor: string | null } {
  const after = pageAfter(by.schema, by.cursor) as Place | null;
  const ordered = [...items].sort((a, b) => by.compare(by.placeOf(a), by.placeOf(b)));
  const rest = after ? ordered.filter((item) => by.compare(by.placeOf(item), after) > 0) : ordered;
  const page = rest.slice(0, by.limit);
  const last = page.at(-1);
  return { items: page, nextCursor: last && rest.length > by.limit ? writeCursor(by.placeOf(last)) : null };
}
