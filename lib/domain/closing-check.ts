import type { Per, Stage } from './procedure';
import { findMissing, findOpenFailures, type StepState } from './step-states';

const PLACE_NOUNS: Record<Exclude<Per, 'unit'>, string> = {
  engine: 'engine',
  cylinder: 'cylinder',
  carb: 'carburettor',
};

/** 'carburettor 2'; nothing for the unit as a whole. */
export function describePlace(per: Per, place: number): string {
  return per === 'unit' || place === 0 ? '' : `${PLACE_NOUNS[per]} ${place}`;
}

/** What a failed step opened, at its place. */
export type FollowUpFact = {
  stepKey: string;
  place: number;
  /** Whether it answers for the failure: it holds the unit still, or was done. One that was withdrawn does not. */
  answers: boolean;
};
export type SignOffKind = 'second_person' | 'test_ride';
export type SignOffFact = {
  kind: SignOffKind;
  personId: string;
  /** A second person signs for what stood then: entries made since are not signed for. */
  stands: boolean;
};

export type ClosingFacts = {
  states: readonly StepState[];
  /** Whether what is being closed holds the unit: a rule that holds, or a defect that does. */
  holdsUnit: boolean;
  followUps: readonly FollowUpFact[];
  signOffs: readonly SignOffFact[];
  wants: { secondPerson: boolean; testRide: boolean };
  /** Who closes; null for the system. */
  closerId: string | null;
};

export type ClosingFault = {
  on: 'missing' | 'failed' | SignOffKind;
  stepKey: string | null;
  place: number;
  stage: Stage | null;
  message: string;
};

const STAGE_WORDS = { found: 'as found', left: 'as left' };

/**
 * What keeps work from being closed, in the order of the procedure: required steps without a result; where the unit
 * is held, steps that stand as failed without a follow-up that answers for them; signatures that the rule asks for.
 */
export function checkClosing(facts: ClosingFacts): ClosingFault[] {
  const { states, followUps, holdsUnit } = facts;
  const perOf = (key: string) => states.find(({ step }) => step.key === key)!.step.per;
  const missing = findMissing(states).map(({ stepKey, title, place, stage }): ClosingFault => {
    const where = [describePlace(perOf(stepKey), place), stage && STAGE_WORDS[stage]].filter(Boolean);
    return {
      on: 'missing',
      stepKey,
      place,
      stage,
      message: `${[title, ...where].join(', ')}: no result yet.`,
    };
  });
  const failed = !holdsUnit
    ? []
    : findOpenFailures(states)
        .filter(
          ({ step, place }) =>
            !followUps.some((one) => one.stepKey === step.key && one.place === place && one.answers),
        )
        .map(({ step, place }): ClosingFault => ({
          on: 'failed',
          stepKey: step.key,
          place,
          stage: null,
          message: `${[step.title, describePlace(step.per, place)].filter(Boolean).join(', ')}: failed. Put it right and enter it again, or open a follow-up, which then holds the unit.`,
        }));
  return [...missing, ...failed, ...checkSignOffs(facts)];
}

function checkSignOffs({ signOffs, wants, closerId }: ClosingFacts): ClosingFault[] {
  const faults: ClosingFault[] = [];
  const say = (on: SignOffKind, message: string) =>
    faults.push({ on, stepKey: null, place: 0, stage: null, message });
  const find = (kind: SignOffKind) => signOffs.find((one) => one.kind === kind);
  if (wants.testRide && !find('test_ride')) say('test_ride', 'Test ride: not signed yet.');
  const second = find('second_person');
  if (wants.secondPerson) {
    if (!second) say('second_person', 'Second person: has not signed yet.');
    else if (!second.stands)
      say('second_person', 'Second person: entries were made after the signature. Have it signed again.');
    else if (second.personId === closerId)
      say('second_person', 'Second person: you signed as the second person, so somebody else closes.');
  }
  return faults;
}
