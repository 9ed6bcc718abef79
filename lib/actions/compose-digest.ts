import { listClosed, listHeldTimes, listNearDuties } from '@/db/queries/digest-facts';
import type { DigestReader } from '@/db/queries/digests';
import { type DockRow, listDocks } from '@/db/queries/docks';
import { listReadiness } from '@/db/queries/readiness';
import type { Context } from '@/lib/context';
import {
  addDays,
  type CalendarDay,
  localDay,
  startOfLocalDay,
  type Weekday,
} from '@/lib/domain/calendar-day';
import { computeDigest, type Digest, type DockFacts } from '@/lib/domain/digest';
import { currentWeek } from '@/lib/domain/digest-week';
import { digestHtml } from '@/lib/domain/digest-html';
import { digestSubject, digestText } from '@/lib/domain/digest-letter';
import { linkTo } from '@/lib/links';
import { toDigestFacts } from './shape-digest';

export type ComposedDigest = {
  digest: Digest;
  subject: string;
  text: string;
  html: string;
  headers: Record<string, string>;
};

/**
 * The digest as one reader gets it, of the docks they see, as things stand now. `weekOn` is the Monday whose week
 * before is looked back on; left out, the Monday of this week.
 */
export async function composeDigest(
  ctx: Context,
  { reader, weekOn }: { reader: DigestReader; weekOn?: CalendarDay },
): Promise<ComposedDigest> {
  const docks = await listDocks(ctx.db, reader.dock_ids.length > 0 ? reader.dock_ids : 'all');
  const week =
    weekOn ??
    currentWeek(
      docks.map((dock) => dock.time_zone),
      ctx.now,
    );
  const digest = computeDigest(week, await loadFacts(ctx, docks, week));
  const unsubscribe = linkTo(`/api/v1/unsubscribe/${reader.unsubscribe_key}`);
  const links = { page: linkTo, unsubscribe };
  return {
    digest,
    subject: digestSubject(digest),
    text: digestText(digest, links),
    html: digestHtml(digest, links),
    // RFC 8058 section 3.1: one click of a mail program's own button ends it.
    headers: {
      'List-Unsubscribe': `<${unsubscribe}>`,
      'List-Unsubscribe-Post': 'List-Unsubscribe=One-Click',
    },
  };
}

async function loadFacts(ctx: Context, docks: DockRow[], weekOn: CalendarDay): Promise<DockFacts[]> {
  const { db, now } = ctx;
  const ids = docks.map((dock) => dock.id);
  const from = addDays(weekOn, -7);
  // A day early: the week begins at another instant at each dock.
  const after = startOfLocalDay(addDays(from, -1), 'UTC');
  const facts = {
    duties: await listNearDuties(db, ids, now),
    readiness: await listReadiness(db, { dockIds: ids }, now),
    heldTimes: await listHeldTimes(db, ids, { now, after }),
    closed: await listClosed(db, ids, { from, to: addDays(weekOn, -1) }),
  };
  return docks.map((dock) => ({
    dockId: dock.id,
    name: dock.name,
    timeZone: dock.time_zone,
    today: localDay(now, dock.time_zone),
    season: dock.season_from && dock.season_to ? { from: dock.season_from, to: dock.season_to } : null,
    openWeekdays: dock.open_weekdays as Weekday[],
    ...toDigestFacts(dock.id, localDay(now, dock.time_zone), facts),
  }));
}
