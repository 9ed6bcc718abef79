import { findDefect, insertDefect } from '@/db/queries/defects';
import { countWrites, lockMeters } from '@/db/queries/units';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';
import { refuseField } from '@/lib/errors';
import type { CreateDefect, Defect } from '@/lib/schemas/defect';
import { accessUnit } from './access';
import { enqueueRefresh } from './assess-again';
import { refusingTaken } from './refusing-taken';
import { toDefect } from './shape-defect';

/**
 * Reports a fault on a unit; the worker opens a repair for it, and a defect that holds the unit holds it at once.
 * An id of the caller's that the same unit's defect has already answers with that one and writes nothing.
 * Throws `not_found`, `forbidden`, and `conflict` on `unitId` when the unit is retired or on `id`.
 */
export async function reportDefect(ctx: Context, input: CreateDefect): Promise<Defect> {
  const unit = await accessUnit(ctx, input.unitId, 'defect.write', 'unitId');
  if (unit.retired_at) throw refuseField('unitId', 'The unit is retired.', 'conflict');
  const row = await refusingTaken({ defect_pkey: ['id', 'Another defect has this id.'] }, () =>
    runTransaction(ctx.db, async (trx) => {
      await lockMeters(trx, [unit.id]);
      const first = input.id ? await findDefect(trx, input.id) : undefined;
      if (first) return first;
      await countWrites(trx, [unit.id]);
      const { id } = await insertDefect(trx, {
        ...(input.id && { id: input.id }),
        unit_id: unit.id,
        title: input.title,
        detail: input.detail || null,
        holds_unit: input.holdsUnit,
        reported_at: ctx.now,
        reported_by: personIdOf(ctx.actor),
      });
      await enqueueRefresh(trx, [unit.id]);
      return findDefect(trx, id);
    }),
  );
  if (row!.unit_id !== unit.id) throw refuseField('id', 'Another defect has this id.', 'conflict');
  return toDefect(row!);
}
