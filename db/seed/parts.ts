import { createPart } from '@/lib/actions/create-part';
import { markLow } from '@/lib/actions/mark-low';
import { recordStockMove } from '@/lib/actions/record-stock-move';
import type { Context } from '@/lib/context';
import type { CreateRule } from '@/lib/schemas/rule';
import type { Crew } from './people';
import { chanceOf } from './random';
import type { RuleKey } from './rules';

const DAY = 86_400_000;

type DemoPart = {
  number: string;
  name: string;
  supplier?: string;
  /** Of a kit: what it holds, by number. */
  holds?: Record<string, number>;
  /** What lies at each dock at the end, and from how many on that is low. */
  stands: readonly [number, number, number];
  lowAt: number;
};

const CHANDLER = 'Harbour Street chandlery';
const SPARES = 'Estuary engine spares';

/** Parts of no maker. At the end some are low: needles at the first dock, kits and hose at the last. */
const PARTS: readonly DemoPart[] = [
  { number: 'CG-11', name: 'Carburettor gasket', supplier: SPARES, stands: [30, 18, 9], lowAt: 6 },
  { number: 'CD-12', name: 'Fuel pump diaphragm', supplier: SPARES, stands: [9, 6, 4], lowAt: 2 },
  { number: 'CD-13', name: 'Metering diaphragm', supplier: SPARES, stands: [8, 6, 3], lowAt: 2 },
  { number: 'CV-14', name: 'Check valve', supplier: SPARES, stands: [16, 12, 8], lowAt: 4 },
  { number: 'CO-15', name: 'Carburettor O-ring', supplier: SPARES, stands: [40, 24, 18], lowAt: 9 },
  { number: 'CF-16', name: 'Filter screen', supplier: SPARES, stands: [8, 6, 5], lowAt: 3 },
  {
    number: 'CK-10',
    name: 'Diaphragm carburettor kit',
    holds: { 'CG-11': 3, 'CD-12': 1, 'CD-13': 1, 'CV-14': 2, 'CO-15': 3, 'CF-16': 1 },
    stands: [9, 7, 2],
    lowAt: 3,
  },
  { number: 'CN-20', name: 'Inlet needle and seat', supplier: SPARES, stands: [2, 5, 4], lowAt: 3 },
  { number: 'SP-30', name: 'Spark plug', supplier: SPARES, stands: [36, 28, 20], lowAt: 12 },
  { number: 'OF-40', name: 'Oil filter', supplier: SPARES, stands: [7, 5, 4], lowAt: 2 },
  { number: 'OL-41', name: 'Engine oil, 1 l', supplier: CHANDLER, stands: [26, 18, 14], lowAt: 9 },
  { number: 'FO-42', name: 'Fogging oil, can', supplier: CHANDLER, stands: [3, 3, 12], lowAt: 2 },
  { number: 'WR-50', name: 'Impeller wear ring', supplier: SPARES, stands: [4, 3, 2], lowAt: 1 },
  { number: 'PS-51', name: 'Jet pump seal', supplier: SPARES, stands: [10, 8, 6], lowAt: 3 },
  {
    number: 'PK-52',
    name: 'Jet pump kit',
    holds: { 'WR-50': 1, 'PS-51': 2 },
    stands: [2, 1, 1],
    lowAt: 0,
  },
  { number: 'SC-60', name: 'Steering cable', supplier: CHANDLER, stands: [2, 1, 1], lowAt: 0 },
  { number: 'TC-61', name: 'Throttle cable', supplier: CHANDLER, stands: [3, 2, 0], lowAt: 0 },
  { number: 'LY-70', name: 'Cut-off lanyard', supplier: CHANDLER, stands: [12, 9, 7], lowAt: 4 },
  { number: 'FX-80', name: 'Fire extinguisher', supplier: CHANDLER, stands: [4, 3, 3], lowAt: 1 },
  { number: 'FH-90', name: 'Fuel hose, 1 m', supplier: CHANDLER, stands: [14, 10, 3], lowAt: 4 },
  { number: 'FF-91', name: 'Fuel filter', supplier: SPARES, stands: [11, 8, 6], lowAt: 3 },
];

type Need = [number: string, quantity: number, per: CreateRule['parts'][number]['per']];
/** What the work of each rule takes, by number. */
const NEEDS: Partial<Record<RuleKey, Need[]>> = {
  carbRebuild: [
    ['CK-10', 1, 'carb'],
    ['FF-91', 1, 'unit'],
  ],
  plugs: [['SP-30', 1, 'cylinder']],
  oil: [
    ['OF-40', 1, 'engine'],
    ['OL-41', 3, 'engine'],
  ],
  pump: [['PS-51', 1, 'unit']],
  fuel: [
    ['FF-91', 1, 'unit'],
    ['FH-90', 2, 'unit'],
  ],
  layUp: [['FO-42', 1, 'engine']],
};

/** Adds the parts, the kits last. Answers their ids by number. */
export async function addParts(ctx: Context): Promise<ReadonlyMap<string, string>> {
  const ids = new Map(PARTS.map(({ number }) => [number, chanceOf(`part ${number}`).uuid()]));
  const kitsLast = [...PARTS].sort((a, b) => Number(!!a.holds) - Number(!!b.holds));
  for (const { number, name, supplier, holds } of kitsLast)
    await createPart(ctx, {
      ...{ id: ids.get(number)!, number, name, supplier: supplier ?? null },
      ...(holds && {
        contents: Object.entries(holds).map(([part, quantity]) => ({ partId: ids.get(part)!, quantity })),
      }),
    });
  return ids;
}

/** The parts of a rule, as the API takes them. */
export function partsOf(key: RuleKey, ids: ReadonlyMap<string, string>): CreateRule['parts'] {
  return (NEEDS[key] ?? []).map(([number, quantity, per]) => ({ partId: ids.get(number)!, quantity, per }));
}

const STEPS = [
  { daysAgo: 180, kind: 'receive', reason: 'Delivery before the season' },
  { daysAgo: 55, kind: 'count', reason: 'Counted after the busy months' },
  { daysAgo: 9, kind: 'receive', reason: 'Delivery' },
] as const;

/**
 * What lies at each dock, as its mechanic writes it down over the last season: a delivery half a year ago, a count
 * after the busy months, and a delivery of late that brings it to where it stands.
 */
export async function stockDocks(
  ctx: Context,
  {
    ids,
    dockIds,
    crews,
  }: { ids: ReadonlyMap<string, string>; dockIds: readonly string[]; crews: readonly Crew[] },
): Promise<void> {
  for (const { daysAgo, kind, reason } of STEPS)
    for (const [index, dockId] of dockIds.entries()) {
      const now = new Date(ctx.now.getTime() - daysAgo * DAY);
      for (const { number, stands } of PARTS) {
        const counted = Math.floor(stands[index]! / 2);
        const quantity = { 180: stands[index]! + 4, 55: counted, 9: stands[index]! - counted }[daysAgo];
        if (quantity === 0 && kind === 'receive') continue;
        const id = chanceOf(`stock ${number} ${index} ${daysAgo}`).uuid();
        await recordStockMove(
          { ...ctx, actor: crews[index]!.mechanic, now },
          { kind, id, partId: ids.get(number)!, dockId, quantity, reason },
        );
      }
    }
  for (const [index, dockId] of dockIds.entries())
    for (const { number, lowAt } of PARTS)
      await markLow({ ...ctx, actor: crews[index]!.mechanic }, ids.get(number)!, { dockId, lowAt });
}
