import { refuseField } from '@/lib/errors';
import { readCursor } from '@/lib/schemas/cursor';

/** Where a page of a list goes on, null for its first. Throws `invalid_input` on `cursor` for one no list answered. */
export function pageAfter<T extends Parameters<typeof readCursor>[0]>(
  schema: T,
  cursor: string | undefined,
): ReturnType<typeof readCursor<T>> {
  if (cursor === undefined) return null;
  const place = readCursor(schema, cursor);
  if (place === null) throw refuseField('cursor', 'is none that a list answered');
  return place;
}
