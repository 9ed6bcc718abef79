import type { Propulsion, Stroke } from '@/lib/domain/rule';
import type { Rule } from './rule';

/** What the form of a rule is drawn from: the rule when there is one, and the fleet it may be for. */
export type RuleFormData = {
  rule: Rule | null;
  mayWrite: boolean;
  models: { id: string; name: string; propulsion: Propulsion; stroke: Stroke | null }[];
  /** `today` is the day it is at the dock. */
  docks: { id: string; name: string; today: string }[];
  /** Those in use. */
  procedures: { id: string; name: string }[];
  /** Those in use, and those the rule names. */
  parts: { id: string; number: string; name: string }[];
  fleet: {
    id: string;
    fleetNumber: string;
    modelId: string;
    dockId: string;
    carbCount: number;
    enteredServiceOn: string;
    engineHours: number;
    outings: number;
  }[];
};
