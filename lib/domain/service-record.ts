import type { ClosedResult, ClosedSignOff } from './closed-work';
import { describePlace } from './closing-check';
import { describeValue } from './entry-words';
import { describeLimits, type Verdict } from './measurement';
import { formatTenths } from './meter';
import { describeMoment } from './moment-words';

/** What a service record is written from. Instants are UTC and shown as the dock's clock shows them. */
export type ServiceRecordFacts = {
  operatorName: string;
  dockName: string;
  timeZone: string;
  fleetNumber: string;
  modelName: string;
  hin: string | null;
  registration: string | null;
  taskTitle: string;
  ruleName: string | null;
  procedure: { name: string; version: number } | null;
  closedAt: Date;
  closedBy: string | null;
  engineHoursTenths: number;
  outings: number;
  minutes: number | null;
  note: string | null;
  results: readonly ClosedResult[];
  signOffs: readonly ClosedSignOff[];
  parts: readonly string[];
  reversed: { at: Date; by: string | null; reason: string } | null;
};

export type ServiceRecord = {
  title: string;
  /** Where a reversed closure says so, above everything else. */
  warning: string | null;
  facts: { term: string; text: string }[];
  /** Each step with its results, in the order of the procedure. */
  steps: { title: string; results: { where: string; text: string; verdict: string | null; by: string }[] }[];
  parts: string[];
  signatures: string[];
  footer: string;
};

const VERDICTS: Record<Verdict, string> = {
  in: 'within limits',
  out: 'OUT OF LIMITS',
  repeats_disagree: 'RUNS DISAGREE',
  places_differ: 'TOO FAR APART',
  too_few_repeats: 'too few runs',
  no_limits: 'not judged',
};
const STAGES = { found: 'as found', left: 'as left' };
const SIGNATURES = { second_person: 'Second person', test_ride: 'Test ride' };

/** A closure as a paper to be kept: the unit, its hours, what was done, found and left, by whom and when. */
export function composeServiceRecord(facts: ServiceRecordFacts): ServiceRecord {
  const moment = (at: Date) => describeMoment(at, facts.timeZone);
  const { reversed } = facts;
  return {
    title: `Service record: ${facts.taskTitle}`,
    warning:
      reversed &&
      `REVERSED on ${moment(reversed.at)} by ${reversed.by ?? 'the system'}: ${reversed.reason} This record no longer counts.`,
    facts: listFacts(facts, moment),
    steps: groupSteps(facts.results, moment),
    parts: [...facts.parts],
    signatures: facts.signOffs.map(
      ({ kind, signedBy, signedAt, note }) =>
        `${SIGNATURES[kind]}: ${signedBy.name}, ${moment(new Date(signedAt))}${note ? `. ${note}` : ''}`,
    ),
    footer: `Times are those of ${facts.dockName} (${facts.timeZone}). The engine maker’s manual, local law and licensed practice come before anything written here.`,
  };
}

function listFacts(facts: ServiceRecordFacts, moment: (at: Date) => string): ServiceRecord['facts'] {
  const { minutes } = facts;
  const rows: [term: string, text: string | null][] = [
    ['Unit', `${facts.fleetNumber}, ${facts.modelName}`],
    ['Hull number (HIN)', facts.hin ?? 'none on record'],
    ['Registration', facts.registration],
    ['Operator', `${facts.operatorName}, ${facts.dockName}`],
    ['Rule', facts.ruleName],
    ['Procedure', facts.procedure && `${facts.procedure.name}, version ${facts.procedure.version}`],
    ['Closed', `${moment(facts.closedAt)} by ${facts.closedBy ?? 'the system'}`],
    ['Engine hours', `${formatTenths(facts.engineHoursTenths)} h, outing ${facts.outings}`],
    ['Time worked', minutes === null ? null : `${minutes} min`],
    ['Note', facts.note],
  ];
  return rows.flatMap(([term, text]) => (text === null ? [] : [{ term, text }]));
}

function groupSteps(results: readonly ClosedResult[], moment: (at: Date) => string): ServiceRecord['steps'] {
  const steps = new Map<string, ServiceRecord['steps'][number]>();
  for (const result of results) {
    const step = steps.get(result.stepKey) ?? { title: result.title, results: [] };
    steps.set(result.stepKey, step);
    const where = [describePlace(result.per, result.place), result.stage && STAGES[result.stage]];
    const limits = result.judged?.limits;
    step.results.push({
      where: where.filter(Boolean).join(', '),
      text: describeValue(result.value),
      verdict: result.judged
        ? `${VERDICTS[result.judged.verdict]}${limits ? ` (${describeLimits(limits)})` : ''}`
        : null,
      by: `${result.enteredBy?.name ?? 'The system'}, ${moment(new Date(result.enteredAt))}`,
    });
  }
  return [...steps.values()];
}
