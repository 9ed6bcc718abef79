import type { MeasuredUnit } from '../measured-value';
import type { Per, Stage, Step, TaskKind } from '../procedure';

/** A procedure that every operator begins with, to be changed to fit its craft and its makers' manuals. */
export type StarterProcedure = {
  name: string;
  kind: TaskKind;
  steps: Step[];
  /** By the key of a step whose failing opens a task: the name of the starter procedure which that task follows. */
  follows?: Readonly<Record<string, string>>;
};

type More = Partial<Pick<Step, 'detail' | 'caution' | 'per' | 'required' | 'when' | 'retests' | 'onFail'>>;

/** Passes, fails or does not apply. */
export function check(key: string, title: string, more: More = {}): Step {
  return { key, kind: 'check', title, per: 'unit', required: true, ...more };
}

/** Judged by the spec of that name, of the model or the unit. */
export function measure(
  key: string,
  title: string,
  [spec, unit, stages]: [spec: string, unit: MeasuredUnit, stages: Stage[]],
  more: More = {},
): Step {
  return {
    key,
    kind: 'measurement',
    title,
    per: 'unit',
    required: true,
    measures: { spec, unit, stages },
    ...more,
  };
}

/** Words for whoever looks at the record later. */
export function note(key: string, title: string, more: More = {}): Step {
  return { key, kind: 'note', title, per: 'unit', required: false, ...more };
}

/** A picture for whoever puts it back together, or looks at the record later. */
export function photo(key: string, title: string, more: More = {}): Step {
  return { key, kind: 'photo', title, per: 'unit', required: false, ...more };
}

/** Stands before the steps it is about. */
export function caution(key: string, title: string, detail: string): Step {
  return { key, kind: 'caution', title, detail, per: 'unit', required: false };
}

/** Every starter procedure opens with this. */
export const MANUAL_FIRST: Step = caution(
  'manual-first',
  'The engine maker’s manual comes first',
  'So do local law and licensed practice. Where they say otherwise than this page, follow them and have the page changed.',
);

/** Done once for each of these. */
export const each = (per: Per): More => ({ per });
