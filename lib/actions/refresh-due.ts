import { lookAtDuePoints, type DutyRule, type LookedUnit } from '@/db/queries/due-look';
import {
  lockAssessments,
  replaceAssessments,
  replaceDuePoints,
  type DuePointToStore,
} from '@/db/queries/due-points';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { computeDuePoints, type Closing, type DuePoint } from '@/lib/domain/due';
import { ruleApplies } from '@/lib/domain/rule';
import { openTasks } from './open-tasks';

/** How often what was corrected is looked at again: whoever writes at the same time has a job of their own. */
const LOOKS = 5;

/**
 * Computes the due points of these units anew from their facts, stores what changed, and opens the tasks that
 * have come within their rule's lead. Running it again changes nothing. Answers how many due points changed.
 *
 * Looks first without a lock, for after most check-ins all is right. What is not is computed once more under the
 * unit's lock, and looked at again when that is committed: a fact that came in between may have looked before.
 */
export async function refreshDue(ctx: Context, { unitIds }: { unitIds: readonly string[] }): Promise<number> {
  let changed = 0;
  let wrong = await findWrong(ctx, unitIds);
  for (let look = 1; wrong.length > 0 && look < LOOKS; look += 1) {
    changed += await correct(ctx, wrong);
    wrong = await findWrong(ctx, wrong);
  }
  await openTasks(ctx, unitIds);
  return changed;
}

/** Those of the units whose stored due points are not those of their facts, or that wait to be assessed. */
async function findWrong(ctx: Context, unitIds: readonly string[]): Promise<string[]> {
  const { units, rules } = await lookAtDuePoints(ctx.db, unitIds);
  const isRight = (unit: LookedUnit) => {
    const points = computeAll([unit], rules);
    return !unit.behind && (unit.points ?? '') === points.map(duePointText).join(',');
  };
  return units.filter((unit) => !isRight(unit)).map((unit) => unit.id);
}

async function correct(ctx: Context, unitIds: readonly string[]): Promise<number> {
  return runTransaction(ctx.db, async (trx) => {
    await lockAssessments(trx, unitIds);
    const { units, rules } = await lookAtDuePoints(trx, unitIds);
    const changed = await replaceDuePoints(trx, unitIds, computeAll(units, rules));
    await replaceAssessments(trx, unitIds, ctx.now);
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

/** A due point as `lookAtDuePoints` writes a stored one. */
function duePointText({ ruleId, triggerIndex, point }: DuePointToStore): string {
  return `${ruleId} ${triggerIndex} ${thresholdsText(point)}`;
}

function thresholdsText(point: DuePoint): string {
  switch (point.on) {
    case 'engine_hours':
      return `h ${point.dueTenths} ${point.upcomingFromTenths} ${point.overdueFromTenths} o d`;
    case 'outings':
      return `h o ${point.dueOutings} ${point.upcomingFromOutings} ${point.overdueFromOutings} d`;
    case 'calendar':
      return `h o d ${point.dueOn} ${point.upcomingFromOn} ${point.overdueFromOn}`;
  }
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
