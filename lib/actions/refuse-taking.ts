import type { LevelRow } from '@/db/queries/stock';
import { checkTaking } from '@/lib/domain/stock';
import { refuseField } from '@/lib/errors';

/**
 * Throws `reason_needed` on `path` when so many cannot be taken from a locked shelf and no reason was stated; what
 * comes in (≤ 0) is never refused. What the task asked about has reserved is its own to take.
 */
export function refuseTaking(
  level: LevelRow,
  quantity: number,
  reason: string | undefined,
  { path, name }: { path: string; name: string | null },
): void {
  if (quantity <= 0 || reason) return;
  const short = checkTaking({ onHand: level.on_hand, reserved: level.reserved - level.own }, quantity);
  if (short) throw refuseField(path, `${name ? `${name}: ` : ''}${short}`, 'reason_needed');
}
