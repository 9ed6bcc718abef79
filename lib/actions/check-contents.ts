import type { Transaction } from 'kysely';
import { lockParts } from '@/db/queries/parts';
import type { DB } from '@/db/tables';
import { Refusal } from '@/lib/errors';
import type { PartCount } from '@/lib/domain/stock';

/** Throws `invalid_input` for every part that a kit cannot hold, at its own path: none, a retired one, a kit. */
export async function checkContents(trx: Transaction<DB>, contents: readonly PartCount[]): Promise<void> {
  const rows = await lockParts(
    trx,
    contents.map(({ partId }) => partId),
  );
  const byId = new Map(rows.map((row) => [row.id, row]));
  const errors = contents.flatMap(({ partId }, index) => {
    const row = byId.get(partId);
    const path = `contents.${index}.partId`;
    if (!row) return [{ path, message: 'is no part of this stock' }];
    if (row.retired_at) return [{ path, message: 'is a part that is retired' }];
    return row.is_kit ? [{ path, message: 'is a kit: name its parts' }] : [];
  });
  if (errors.length > 0) throw new Refusal('invalid_input', 'A kit holds parts in use.', errors);
}
