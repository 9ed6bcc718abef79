import { endPastLayUp, findLayUp, insertLayUp } from '@/db/queries/lay-ups';
import { lockUnits } from '@/db/queries/units';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';
import { localDay } from '@/lib/domain/calendar-day';
import { refuseField } from '@/lib/errors';
import type { CreateLayUp, LayUp } from '@/lib/schemas/lay-up';
import { accessUnit } from './access';
import { refusingTaken } from './refusing-taken';
import { toLayUp } from './shape-lay-up';

/**
 * Takes a unit out of service on purpose from a day on, until a last day or until somebody ends it. Managers and
 * mechanics of the dock. Throws `not_found`, `forbidden`, and `conflict` on `unitId` when the unit is retired or has
 * a lay-up that has not ended.
 */
export async function recordLayUp(ctx: Context, input: CreateLayUp): Promise<LayUp> {
  const unit = await accessUnit(ctx, input.unitId, 'lay-up.write', 'unitId');
  if (unit.retired_at) throw refuseField('unitId', 'The unit is retired.', 'conflict');
  const taken: [string, string] = ['unitId', 'The unit has a lay-up that has not ended. End that one first.'];
  return refusingTaken({ lay_up_open: taken }, () =>
    runTransaction(ctx.db, async (trx) => {
      await lockUnits(trx, [unit.id]);
      await endPastLayUp(trx, unit.id, localDay(ctx.now, unit.time_zone), ctx.now);
      const { id } = await insertLayUp(trx, {
        unit_id: unit.id,
        from_on: input.fromOn,
        until_on: input.untilOn ?? null,
        reason: input.reason,
        recorded_at: ctx.now,
        recorded_by: personIdOf(ctx.actor),
      });
      return toLayUp((await findLayUp(trx, id))!);
    }),
  );
}
