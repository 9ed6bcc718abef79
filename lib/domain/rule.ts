import type { CalendarDay } from './calendar-day';

/** What drives a unit. */
export type Propulsion = 'jet' | 'outboard' | 'inboard' | 'electric';
/** Strokes of the engine's cycle; an electric unit has none. */
export type Stroke = 'two' | 'four';

/** What a trigger can count besides days. */
export type MeterKind = 'engine_hours' | 'outings';
/** What the next due point is counted from: the hour or date it was due, or the one it was done. */
export type Anchor = 'scheduled' | 'completed';
/** Every so many tenths of an engine hour, or every so many outings; `first` is the first due point. */
export type MeterTrigger = { on: MeterKind; every: number; first?: number; anchor: Anchor };
/** By the calendar: a date-only recurrence rule (RFC 5545, see recurrence.ts) from its start. */
export type CalendarTrigger = { on: 'calendar'; rrule: string; start: CalendarDay; anchor: Anchor };
export type Trigger = MeterTrigger | CalendarTrigger;

/** How long before a due point a rule counts as upcoming. */
export type Lead = { tenths: number; outings: number; days: number };
/** How far before and after a due point the work still counts as done on schedule. */
export type Window = {
  earlyTenths: number;
  lateTenths: number;
  earlyOutings: number;
  lateOutings: number;
  earlyDays: number;
  lateDays: number;
};
/** All that due points are computed from on the side of the rule. */
export type Schedule = { triggers: Trigger[]; lead: Lead; window: Window };

/** Which units a rule is for. Every part given must fit; a part left out fits any unit. */
export type Scope = {
  modelIds?: string[];
  propulsion?: Propulsion;
  stroke?: Stroke;
  carbCount?: { min?: number; max?: number };
  dockIds?: string[];
};
/** What of a unit a scope looks at. */
export type ScopedUnit = {
  modelId: string;
  propulsion: Propulsion;
  stroke: Stroke | null;
  carbCount: number;
  dockId: string;
};

/** Minutes of work: a base, and more for each carburettor and each engine. */
export type Labour = { baseMinutes: number; perCarbMinutes: number; perEngineMinutes: number };
/** A part a rule uses, and for each of what. */
export type PartNeed = { partId: string; quantity: number; per: 'unit' | 'engine' | 'cylinder' | 'carb' };
/** What of a unit the work grows with. `cylinders` is the count of the whole unit. */
export type UnitCounts = { engines: number; cylinders: number; carbCount: number };

/** Whether a rule is for a unit. An empty list of models or docks names none, so it fits no unit. */
export function ruleApplies(scope: Scope, unit: ScopedUnit): boolean {
  const { modelIds, propulsion, stroke, carbCount, dockIds } = scope;
  return (
    (modelIds === undefined || modelIds.includes(unit.modelId)) &&
    (propulsion === undefined || propulsion === unit.propulsion) &&
    (stroke === undefined || stroke === unit.stroke) &&
    (carbCount?.min === undefined || unit.carbCount >= carbCount.min) &&
    (carbCount?.max === undefined || unit.carbCount <= carbCount.max) &&
    (dockIds === undefined || dockIds.includes(unit.dockId))
  );
}

/** Planned minutes of work on one unit: 60 + 45 for each of 3 carburettors is 195. */
export function computeMinutes(labour: Labour, unit: Pick<UnitCounts, 'carbCount' | 'engines'>): number {
  return labour.baseMinutes + labour.perCarbMinutes * unit.carbCount + labour.perEngineMinutes * unit.engines;
}
