import { type DigestReader, listDigestReaders, listDigestWeeks } from '@/db/queries/digests';
import { type DockRow, listDocks } from '@/db/queries/docks';
import type { Context } from '@/lib/context';
import { addDays, localDay } from '@/lib/domain/calendar-day';
import { digestWeekToSend } from '@/lib/domain/digest-week';
import { enqueue } from '@/lib/enqueue';

/** Puts the digest of every manager whose time it is, and who has none for the week, on the queue. */
export async function tickDigests(ctx: Context): Promise<void> {
  const docks = await listDocks(ctx.db, 'all');
  const there = await listDigestWeeks(ctx.db, addDays(localDay(ctx.now, 'UTC'), -7));
  for (const reader of await listDigestReaders(ctx.db)) {
    const weekOn = digestWeekToSend(timeZonesOf(reader, docks), ctx.now);
    if (!weekOn || there.has(`${reader.id} ${weekOn}`)) continue;
    await enqueue(ctx.db, 'send-digest', { personId: reader.id, weekOn }, { key: `${reader.id}:${weekOn}` });
  }
}

/** The time zones of the docks that somebody sees. */
export function timeZonesOf(reader: DigestReader, docks: readonly DockRow[]): string[] {
  return docks
    .filter((dock) => reader.dock_ids.length === 0 || reader.dock_ids.includes(dock.id))
    .map((dock) => dock.time_zone);
}
