import type { MeasuredUnit, MeasuredValue } from './measured-value';

/** What a step is done once for. */
export type Per = 'unit' | 'engine' | 'cylinder' | 'carb';
/** As found, before the work; as left, after it (metrology's terms). */
export type Stage = 'found' | 'left';
/** What a task can be. */
export type TaskKind = 'inspection' | 'service' | 'rebuild' | 'repair';
export type StepKind = 'check' | 'measurement' | 'note' | 'photo' | 'caution';

/** How an earlier step came out. */
export type Condition = { step: string; outcome: 'pass' | 'fail' };

export type Step = {
  /** Names the step within its procedure, in every version of it. */
  key: string;
  kind: StepKind;
  title: string;
  detail?: string | undefined;
  /** What can hurt somebody at this step. */
  caution?: string | undefined;
  per: Per;
  required: boolean;
  /** Of a measurement: the spec it is judged by, the unit of measure it is taken in, before and after or only one. */
  measures?: { spec: string; unit: MeasuredUnit; stages: Stage[] } | undefined;
  /** Done only where any of these earlier steps came out like this. */
  when?: Condition[] | undefined;
  /** The earlier step that this one tests again after the work: it then says how that one stands at last. */
  retests?: string | undefined;
  /** What a failing step opens, for that place alone. */
  onFail?:
    | {
        open: 'task' | 'defect';
        title: string;
        kind?: TaskKind | undefined;
        holdsUnit: boolean;
        procedureId?: string | undefined;
      }
    | undefined;
};

export type EntryValue =
  | { kind: 'check'; outcome: 'pass' | 'fail' | 'not_applicable'; note?: string | undefined }
  | { kind: 'measurement'; runs: MeasuredValue[]; note?: string | undefined }
  | { kind: 'note'; text: string }
  | { kind: 'photo'; attachmentIds: string[] }
  /** What was entered is taken back. */
  | { kind: 'cleared' };

/** What stands at a step now: the latest entry of its place and, for a measurement, stage. */
export type StepEntry = { stepKey: string; place: number; stage: Stage | null; value: EntryValue };

/** A follow-up's only place: the second carburettor. Steps per anything else are as ever. */
export type OnlyPlace = { per: Per; place: number };
