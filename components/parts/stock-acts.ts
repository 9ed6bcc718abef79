import type { Part } from '@/lib/schemas/part';
import type { RecordStockMove } from '@/lib/schemas/stock';

export type Act = RecordStockMove['kind'] | 'low';

type Words = { label: string; button: string; done: string; amount: string; hint?: string };

/** What one may do to stock, in words. */
export const ACTS: Record<Act, Words> = {
  receive: { label: 'Receive', button: 'Receive', done: 'received', amount: 'How many came' },
  count: {
    label: 'Count',
    button: 'Write the count',
    done: 'counted',
    amount: 'How many there are',
    hint: 'All that lie there, those set aside too.',
  },
  move: { label: 'Move', button: 'Move', done: 'moved', amount: 'How many go' },
  make_up: {
    label: 'Make up',
    button: 'Make up the kits',
    done: 'made up',
    amount: 'How many kits',
    hint: 'Takes what each holds from the same shelves.',
  },
  break_up: {
    label: 'Break up',
    button: 'Break up the kits',
    done: 'broken up',
    amount: 'How many kits',
    hint: 'Puts what each holds back as single parts.',
  },
  low: {
    label: 'Low mark',
    button: 'Set the mark',
    done: 'the mark is set',
    amount: 'Low from',
    hint: 'When so many or fewer are free. Leave empty for never.',
  },
};

/** What can be done to a part where so many docks are one's own. */
export function actsFor({ isKit }: Pick<Part, 'isKit'>, docks: number): Act[] {
  return [
    'receive',
    'count',
    ...(docks > 1 ? ['move' as const] : []),
    ...(isKit ? ['make_up' as const, 'break_up' as const] : []),
    'low',
  ];
}
