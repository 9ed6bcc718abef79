import type { Context } from '@/lib/context';
import {
  computeDuePoint,
  computeFollowing,
  computeState,
  computeWorstState,
  type History,
  type Standing,
} from '@/lib/domain/due';
import type { PreviewRule, RulePreview } from '@/lib/schemas/rule';
import { fromDuePoint, fromFollowing, toSchedule, toTenths } from '@/lib/schemas/schedule-shape';
import { requireFleetWide } from './access';

/**
 * What a rule would mean for a unit, saving nothing. The closings are replayed in their order from the first due
 * point; `following` begins with the point after `due` and takes each as closed when due.
 */
export async function previewRule(ctx: Context, input: PreviewRule): Promise<RulePreview> {
  requireFleetWide(ctx, 'rule.preview');
  const schedule = toSchedule(input);
  const history: History = {
    enteredServiceOn: input.unit.enteredServiceOn,
    closings: input.closings.map(({ on, engineHours, outings }) => ({
      on,
      engineHoursTenths: toTenths(engineHours),
      outings,
    })),
  };
  const standing: Standing = {
    engineHoursTenths: toTenths(input.unit.engineHours),
    outings: input.unit.outings,
    today: input.today,
  };
  const triggers = schedule.triggers.map((trigger, index) => {
    const point = computeDuePoint(trigger, schedule, history);
    return {
      index,
      due: point && fromDuePoint(point),
      state: computeState(point, standing),
      following: computeFollowing(trigger, schedule, history, input.count).map((at) =>
        fromFollowing(trigger.on, at),
      ),
    };
  });
  return { triggers, state: computeWorstState(triggers.map(({ state }) => state)) };
}
