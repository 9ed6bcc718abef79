import { z } from 'zod';
import { flag, id, line, pageQuery } from './common';
import { level } from './part';

/**
 * What a person does to stock. `id` is made by the caller: the same one again writes nothing. Of a count, `quantity`
 * is how many there are; of a move, `toDockId` is where they go.
 */
export const recordStockMove = z
  .strictObject({
    id,
    kind: z.enum(
      ['receive', 'count', 'move', 'make_up', 'break_up'],
      'is receive, count, move, make_up or break_up',
    ),
    partId: id,
    dockId: id,
    toDockId: id.optional(),
    quantity: z
      .int('give a whole number')
      .min(0, 'cannot be below 0')
      .max(100_000, 'cannot be above 100,000'),
    reason: line(300).optional(),
  })
  .superRefine(({ kind, dockId, toDockId, quantity }, ctx) => {
    const say = (path: string, message: string) => ctx.addIssue({ code: 'custom', path: [path], message });
    if (kind !== 'count' && quantity === 0) say('quantity', 'is at least 1');
    if (kind === 'move' && toDockId === undefined) say('toDockId', 'say where they go');
    if (kind !== 'move' && toDockId !== undefined) say('toDockId', 'belongs to a move');
    if (toDockId === dockId) say('toDockId', 'is where they lie already');
  });

/** From how many on a part is low at a dock; null for never. */
export const markLow = z.strictObject({
  dockId: id,
  lowAt: z.int('give a whole number').min(0, 'cannot be below 0').max(100_000, 'is too many').nullable(),
});

export const stockQuery = z.object({ dockId: id.optional(), low: flag, ...pageQuery });

export const stockMovesQuery = z.object({
  partId: id.optional(),
  dockId: id.optional(),
  taskId: id.optional(),
  ...pageQuery,
});

/** Where a page of moves ended. */
export const movePlace = z.object({ seq: z.int() });
/** Where a page of stock ended. */
export const stockPlace = z.object({
  low: z.boolean(),
  name: z.string(),
  partId: z.uuid(),
  dockId: z.uuid(),
});

/** What lies at one dock of one part, with the part's words. */
export const stockLine = level.extend({
  partId: id,
  number: z.string(),
  name: z.string(),
  isKit: z.boolean(),
});

/** One move of the ledger; `balance` is what was on hand after it. */
export const stockMove = z.object({
  id,
  kind: z.enum(['received', 'counted', 'moved_in', 'moved_out', 'made_up', 'broken_up', 'taken', 'put_back']),
  partId: id,
  partNumber: z.string(),
  partName: z.string(),
  dockId: id,
  dockName: z.string(),
  timeZone: z.string(),
  quantity: z.int(),
  balance: z.int(),
  task: z.object({ id, title: z.string(), fleetNumber: z.string() }).nullable(),
  closureId: id.nullable(),
  reason: z.string().nullable(),
  movedAt: z.string(),
  movedBy: z.object({ id, name: z.string() }).nullable(),
});

export const recordedMoves = z.object({ moves: z.array(stockMove) });

export type RecordStockMove = z.output<typeof recordStockMove>;
export type MarkLow = z.output<typeof markLow>;
export type StockQuery = z.output<typeof stockQuery>;
export type StockMovesQuery = z.output<typeof stockMovesQuery>;
export type StockLine = z.output<typeof stockLine>;
export type StockMove = z.output<typeof stockMove>;
export type RecordedMoves = z.output<typeof recordedMoves>;
