import { z } from 'zod';
import type { HoldShown } from './availability';
import { id } from './common';
import type { Dock } from './dock';
import type { UnitDuePoints } from './due-point';
import { HISTORY_KINDS, type HistoryEntry, type HistoryKind } from './history';
import type { LayUp } from './lay-up';
import type { Model } from './model';
import type { Unit } from './unit';

/** What a unit is now; a retired one is none of the three. */
export type Readiness = 'ready' | 'out' | 'held';

const READINESS = ['ready', 'out', 'held', 'retired'] as const;

/** What the list of units is narrowed by; anything that is no such thing narrows nothing. */
export const fleetFilter = z.object({
  dock: id.optional().catch(undefined),
  model: id.optional().catch(undefined),
  state: z.enum(READINESS).optional().catch(undefined),
});

export type FleetFilter = z.output<typeof fleetFilter>;

/** What of a unit's history its page shows; anything that is no such thing shows all, from the latest. */
export const unitPageQuery = z.object({
  kind: z.enum(HISTORY_KINDS).optional().catch(undefined),
  cursor: z.string().max(500).optional().catch(undefined),
});

/** What is left before a unit's next hold by each measure, and the rule that holds first. */
export type Room = {
  hoursToHold: number | null;
  outingsToHold: number | null;
  daysToHold: number | null;
  holdingRuleName: string | null;
};

/** A unit as the list shows it. `state` is null once it is retired. */
export type FleetUnit = Unit & Room & { state: Readiness | null; holds: HoldShown[] };

/** What the screen of all units is drawn from. `empty` when there is none, whatever it is narrowed by. */
export type FleetPage = {
  units: FleetUnit[];
  docks: { id: string; name: string }[];
  models: { id: string; name: string }[];
  empty: boolean;
  mayAdd: boolean;
};

/** What a unit's own page is drawn from; instants are ISO text, `timeZone` its dock's. */
export type UnitPage = {
  unit: FleetUnit;
  now: string;
  today: string;
  timeZone: string;
  shownHours: number;
  out: { startedAt: string | null; dueBackAt: string | null } | null;
  layUp: LayUp | null;
  duties: UnitDuePoints;
  history: { items: HistoryEntry[]; nextCursor: string | null; kind: HistoryKind | null; paged: boolean };
  may: Record<'change' | 'layUp' | 'reportDefect' | 'openTask' | 'voidReading' | 'recordBaseline', boolean>;
};

/** What the form of a unit is drawn from, `unit` null for a new one. */
export type UnitFormData = {
  unit: Unit | null;
  /** Whether the carburettor count is the unit's own instead of its model's. */
  ownCarbCount: boolean;
  docks: Pick<Dock, 'id' | 'name' | 'craftNumbers'>[];
  models: Pick<Model, 'id' | 'name' | 'carbCount'>[];
  today: string;
};

/** What the screens of docks and models are drawn from. */
export type DocksPage = { docks: (Dock & { unitCount: number })[]; mayWrite: boolean };
export type ModelsPage = { models: (Model & { unitCount: number })[]; mayWrite: boolean };
