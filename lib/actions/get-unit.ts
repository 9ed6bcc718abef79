import type { Context } from '@/lib/context';
import type { Unit } from '@/lib/schemas/unit';
import { accessUnit } from './access';
import { toUnit } from './shape-unit';

/** One unit, a retired one too. Throws `not_found` or `forbidden`. */
export async function getUnit(ctx: Context, id: string): Promise<Unit> {
  return toUnit(await accessUnit(ctx, id, 'unit.read'));
}
