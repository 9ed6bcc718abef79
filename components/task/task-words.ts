import type { Urgency } from '@/lib/domain/urgency';
import { countOf, describeDay } from '@/lib/domain/words';
import type { Task, TaskDuePoint } from '@/lib/schemas/task';

export const kindWords: Record<Task['kind'], string> = {
  inspection: 'Inspection',
  service: 'Service',
  rebuild: 'Rebuild',
  repair: 'Repair',
};

/** What each part of the list asks for, the most urgent first. */
export const urgencyWords: Record<Urgency, { title: string; lead: string }> = {
  holding: { title: 'Holding a unit', lead: 'Nobody can hire these units out until the work is done.' },
  overdue: { title: 'Overdue', lead: 'Past the last moment allowed, without holding the unit.' },
  today: { title: 'Under way or planned for today', lead: 'Started, or planned for today or a day gone by.' },
  due: { title: 'Due', lead: 'Due now and planned on no day.' },
  unplanned: { title: 'Not planned yet', lead: 'Coming up, or asked for by somebody.' },
  later: { title: 'Planned for later', lead: 'Each on its day.' },
};

/** An amount in the measure of a due point: '2.0 h', '1 outing', '3 days'. */
export function amountText(on: TaskDuePoint['on'], amount: number): string {
  if (on === 'engine_hours') return `${amount.toFixed(1)} h`;
  return countOf(amount, on === 'outings' ? 'outing' : 'day');
}

/** Where a due point is: '50.0 h', 'outing 40', 'Fri 5 Jun 2026'. */
export function placeText(point: Pick<TaskDuePoint, 'dueAtHours' | 'dueAtOutings' | 'dueOn'>): string {
  if (point.dueAtHours !== null) return `${point.dueAtHours.toFixed(1)} h`;
  if (point.dueAtOutings !== null) return `outing ${point.dueAtOutings}`;
  return point.dueOn === null ? '' : describeDay(point.dueOn);
}

/** What goes on after the word of the state: 'by 2.0 h', 'in 3 days', 'today'. */
export function stateDetail({ on, left }: TaskDuePoint): string {
  if (left < 0) return `by ${amountText(on, -left)}`;
  if (left > 0) return `in ${amountText(on, left)}`;
  return on === 'calendar' ? 'today' : 'now';
}

/** A due point as a sentence: 'Was due at 50.0 h, 2.0 h ago.', 'Due on Fri 5 Jun 2026, in 3 days.' */
export function pointText(point: TaskDuePoint): string {
  const { on, left } = point;
  const at = on === 'calendar' ? 'on' : 'at';
  if (left < 0) return `Was due ${at} ${placeText(point)}, ${amountText(on, -left)} ago.`;
  if (left === 0) return `Due ${at} ${placeText(point)}: ${on === 'calendar' ? 'today' : 'now'}.`;
  return `Due ${at} ${placeText(point)}, in ${amountText(on, left)}.`;
}

const RANK = ['overdue', 'due', 'upcoming', 'clear'];

/** The due point that makes the task as urgent as it is: the worst, the first of them on a tie. */
export function worstPoint(points: readonly TaskDuePoint[]): TaskDuePoint | null {
  return points.reduce<TaskDuePoint | null>(
    (worst, next) => (worst === null || RANK.indexOf(next.state) < RANK.indexOf(worst.state) ? next : worst),
    null,
  );
}

/** Planned work as one reads a clock: '45 min', '2 h 15 min'. */
export function minutesText(minutes: number): string {
  const [hours, rest] = [Math.floor(minutes / 60), minutes % 60];
  if (hours === 0) return `${rest} min`;
  return rest === 0 ? `${hours} h` : `${hours} h ${rest} min`;
}
