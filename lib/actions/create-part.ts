import { findPart, insertPart, replaceContents } from '@/db/queries/parts';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';
import type { CreatePart, Part } from '@/lib/schemas/part';
import { requireFleetWide } from './access';
import { checkContents } from './check-contents';
import { getPart } from './get-part';
import { refusingTaken } from './refusing-taken';
import { PART_TAKEN } from './shape-part';

/**
 * Adds a part, or with `contents` a kit of parts. An id that is there already answers with that part and writes
 * nothing. Managers and mechanics of all docks. Throws `conflict` on `number`, `invalid_input` on what a kit cannot
 * hold.
 */
export async function createPart(ctx: Context, input: CreatePart): Promise<Part> {
  requireFleetWide(ctx, 'part.write');
  await refusingTaken(PART_TAKEN, () =>
    runTransaction(ctx.db, async (trx) => {
      if (await findPart(trx, input.id)) return;
      await checkContents(trx, input.contents ?? []);
      await insertPart(trx, {
        id: input.id,
        number: input.number,
        name: input.name,
        supplier: input.supplier ?? null,
        is_kit: input.contents !== undefined,
        created_at: ctx.now,
        created_by: personIdOf(ctx.actor),
        retired_by: null,
      });
      await replaceContents(trx, input.id, input.contents ?? []);
    }),
  );
  return getPart(ctx, input.id);
}
