import type { PartLevel, PartLine } from '@/lib/schemas/part';
import type { StockMove } from '@/lib/schemas/stock';
import type { StockState } from './StockMark';

export const MOVE_WORDS: Record<StockMove['kind'], string> = {
  received: 'Received',
  counted: 'Counted',
  moved_in: 'Moved in',
  moved_out: 'Moved out',
  made_up: 'Made up',
  broken_up: 'Broken up',
  taken: 'Taken',
  put_back: 'Put back',
};

export const PER_WORDS = {
  unit: 'for each unit',
  engine: 'for each engine',
  cylinder: 'for each cylinder',
  carb: 'for each carburettor',
};

/** How a shelf stands; null for one that nothing is to be said of. */
export function stateOf({ onHand, low }: Pick<PartLevel, 'onHand' | 'low'>): StockState | null {
  if (onHand < 0) return 'owed';
  return low ? 'low' : null;
}

/** '+3', '−2' or '0'. */
export function signed(quantity: number): string {
  if (quantity === 0) return '0';
  return quantity > 0 ? `+${quantity}` : `−${-quantity}`;
}

/** What a list offers of parts: 'Plug, PL-12'. */
export function partOptions(parts: readonly Pick<PartLine, 'id' | 'name' | 'number'>[]) {
  return parts.map(({ id, name, number }) => ({ value: id, label: `${name}, ${number}` }));
}
