import { z } from 'zod';

/** Where a page ended, as the text a caller sends back for the next one. */
export function writeCursor(place: object): string {
  return Buffer.from(JSON.stringify(place)).toString('base64url');
}

/** Where a page ended of a list that is in order of instants. */
export const instantPlace = z.object({ at: z.iso.datetime(), id: z.uuid() });

/** The place a cursor names, null when it is none that fits the schema. */
export function readCursor<T extends z.ZodType>(schema: T, cursor: string): z.output<T> | null {
  try {
    return schema.safeParse(JSON.parse(Buffer.from(cursor, 'base64url').toString('utf8'))).data ?? null;
  } catch {
    return null;
  }
}
