import { listUnproven, lookAtDuePoints, type DutyRule, type LookedUnit } from '@/db/queries/due-look';
import {
  lockAssessments,
  replaceAssessments,
  replaceDuePoints,
  type DuePointToStore,
} from '@/db/queries/due-points';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { computeDuePoints, type Closing } from '@/lib/domain/due';
import { ruleApplies } from '@/lib/domain/rule';

/** How often what was corrected is looked at again: whoever writes at the same time has a job of their own. */
const LOOKS = 5;
/** Units to one look, which locks nothing. */
const LOOKED = 1000;
/** Units to one correction, so that its locks are held for a moment only. */
const CORRECTED = 200;
/** Batches under way at a time: one is computed while the database reads the other. */
const LANES = 2;

/**
 * Makes the stored due points of these units those of their facts. Answers how many changed.
 *
 * Looks first without a lock, by fingerprint, for after most check-ins all is right; `thorough` computes every unit
 * nevertheless. What was computed is looked at again when that is committed: a fact that came in between may have
 * looked before.
 */
export async function correctDuePoints(
  ctx: Context,
  unitIds: readonly string[],
  { thorough = false }: { thorough?: boolean } = {},
): Promise<number> {
  const look = async (ids: readonly string[]) =>
    (await inBatches(ids, LOOKED, (batch) => listUnproven(ctx.db, batch))).flat();
  let changed = 0;
  let doubtful = thorough ? unitIds : await look(unitIds);
  for (let looks = 1; doubtful.length > 0 && looks < LOOKS; looks += 1) {
    const corrected = await inBatches(doubtful, CORRECTED, (batch) => correct(ctx, batch));
    changed += corrected.reduce((sum, count) => sum + count, 0);
    doubtful = await look(doubtful);
  }
  return changed;
}

/** What `work` answers for each batch of the units. */
async function inBatches<T>(
  unitIds: readonly string[],
  size: number,
  work: (batch: readonly string[]) => Promise<T>,
): Promise<T[]> {
  const answers: T[] = [];
  let next = 0;
  const lane = async () => {
    while (next < unitIds.length) {
      const from = next;
      next += size;
      answers.push(await work(unitIds.slice(from, from + size)));
    }
  };
  await Promise.all(Array.from({ length: LANES }, lane));
  return answers;
}

async function correct(ctx: Context, unitIds: readonly string[]): Promise<number> {
  return runTransaction(ctx.db, async (trx) => {
    await lockAssessments(trx, unitIds);
    const { units, rules } = await lookAtDuePoints(trx, unitIds);
    const changed = await replaceDuePoints(trx, unitIds, computeAll(units, rules));
    await replaceAssessments(trx, units, ctx.now);
    return changed;
  });
}

/** Every due point of these units under the rules that apply to them, in the order of the rules. */
function computeAll(units: readonly LookedUnit[], rules: readonly DutyRule[]): DuePointToStore[] {
  const points: DuePointToStore[] = [];
  for (const unit of units) {
    if (unit.retired) continue;
    const closings = readClosings(unit.closings ?? '');
    for (const rule of rules) {
      if (!ruleApplies(rule.scope, unit)) continue;
      const schedule = { triggers: rule.triggers, lead: rule.lead, window: rule.tolerance };
      const history = { enteredServiceOn: unit.enteredServiceOn, closings: closings.get(rule.id) ?? [] };
      computeDuePoints(schedule, history).forEach((point, triggerIndex) => {
        if (point) points.push({ unitId: unit.id, ruleId: rule.id, triggerIndex, point });
      });
    }
  }
  return points;
}

/** The closings of a unit by rule. */
function readClosings(text: string): Map<string, Closing[]> {
  const byRule = new Map<string, Closing[]>();
  for (const one of text ? text.split(',') : []) {
    const [ruleId, on, tenths, outings] = one.split(' ') as [string, string, string, string];
    const closing = { on, engineHoursTenths: Number(tenths), outings: Number(outings) };
    const list = byRule.get(ruleId);
    if (list) list.push(closing);
    else byRule.set(ruleId, [closing]);
  }
  return byRule;
}
