import { lockParts, replaceContents, updatePart } from '@/db/queries/parts';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { refuseField } from '@/lib/errors';
import type { ChangePart, Part } from '@/lib/schemas/part';
import { accessPart } from './access';
import { checkContents } from './check-contents';
import { getPart } from './get-part';
import { refusingTaken } from './refusing-taken';
import { PART_TAKEN } from './shape-part';

/**
 * Changes a part's words, or what a kit holds from now on; kits made up before are what they are. Managers and
 * mechanics of all docks. Throws `conflict` on `number` and for a part that is retired, `invalid_input` on
 * `contents` of a part that is no kit and on what a kit cannot hold.
 */
export async function changePart(ctx: Context, id: string, input: ChangePart): Promise<Part> {
  await accessPart(ctx, id, 'part.write');
  const { contents, ...words } = input;
  await refusingTaken(PART_TAKEN, () =>
    runTransaction(ctx.db, async (trx) => {
      const [row] = await lockParts(trx, [id]);
      if (row?.retired_at) throw refuseField('id', 'is retired', 'conflict');
      if (contents && !row?.is_kit) throw refuseField('contents', 'belong to a kit, and this is a part');
      if (contents) await checkContents(trx, contents);
      if (Object.keys(words).length > 0) await updatePart(trx, id, words);
      if (contents) await replaceContents(trx, id, contents);
    }),
  );
  return getPart(ctx, id);
}
