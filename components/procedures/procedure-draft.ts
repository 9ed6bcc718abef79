import type { MeasuredUnit } from '@/lib/domain/measured-value';
import type { Per, Step } from '@/lib/domain/procedure';

/** A step as it is written; `row` tells steps apart while they move and are renamed. */
export type StepDraft = {
  row: number;
  /** Empty until it is saved: then it follows from the title, and stays. */
  key: string;
  kind: Step['kind'];
  title: string;
  detail: string;
  caution: string;
  per: Per;
  required: boolean;
  spec: string;
  unit: MeasuredUnit;
  stages: 'found' | 'left' | 'both';
  when: { row: number; outcome: 'pass' | 'fail' }[];
  /** The earlier step that this one tests again, by row. */
  retests: number | null;
  opens: 'nothing' | 'defect' | 'task';
  failTitle: string;
  failHolds: boolean;
  /** What of a follow-up this form does not show, kept as it is. */
  failRest: Pick<NonNullable<Step['onFail']>, 'kind' | 'procedureId'>;
};

export function newStep(row: number): StepDraft {
  return {
    ...{ row, key: '', kind: 'check', title: '', detail: '', caution: '', per: 'unit', required: true },
    ...{ spec: '', unit: 'psi', stages: 'both', when: [], retests: null },
    ...{ opens: 'nothing', failTitle: '', failHolds: true, failRest: {} },
  };
}

/** The steps of a procedure as the form has them. */
export function draftSteps(steps: readonly Step[]): StepDraft[] {
  return steps.map((step, row) => ({
    ...newStep(row),
    key: step.key,
    kind: step.kind,
    title: step.title,
    detail: step.detail ?? '',
    caution: step.caution ?? '',
    per: step.per,
    required: step.required,
    ...(step.measures && {
      spec: step.measures.spec,
      unit: step.measures.unit,
      stages: step.measures.stages.length === 2 ? ('both' as const) : step.measures.stages[0]!,
    }),
    when: (step.when ?? []).map(({ step: key, outcome }) => ({
      row: steps.findIndex((other) => other.key === key),
      outcome,
    })),
    ...(step.retests && { retests: steps.findIndex((other) => other.key === step.retests) }),
    ...(step.onFail && {
      opens: step.onFail.open,
      failTitle: step.onFail.title,
      failHolds: step.onFail.holdsUnit,
      failRest: { kind: step.onFail.kind, procedureId: step.onFail.procedureId },
    }),
  }));
}

/** What was written as the API takes it. Only what the step's kind can have goes along. */
export function toSteps(drafts: readonly StepDraft[]) {
  const keys = nameSteps(drafts);
  return drafts.map((draft) => {
    const decides = canDecide(draft);
    return {
      key: keys.get(draft.row)!,
      kind: draft.kind,
      title: draft.title,
      ...(draft.detail.trim() && { detail: draft.detail }),
      ...(draft.kind !== 'caution' && draft.caution.trim() && { caution: draft.caution }),
      per: draft.per,
      required: draft.kind !== 'caution' && draft.required,
      ...(draft.kind === 'measurement' && {
        measures: {
          spec: draft.spec,
          unit: draft.unit,
          stages: draft.stages === 'both' ? (['found', 'left'] as const) : [draft.stages],
        },
      }),
      ...(draft.when.length > 0 && {
        when: draft.when.map(({ row, outcome }) => ({ step: keys.get(row) ?? 'gone', outcome })),
      }),
      ...(decides && draft.retests !== null && { retests: keys.get(draft.retests) ?? 'gone' }),
      ...(decides &&
        draft.opens !== 'nothing' && {
          onFail: {
            ...draft.failRest,
            open: draft.opens,
            title: draft.failTitle,
            holdsUnit: draft.failHolds,
          },
        }),
    };
  });
}

/** Whether a step can pass and fail, so that others may depend on it. */
export function canDecide({ kind }: Pick<StepDraft, 'kind'>): boolean {
  return kind === 'check' || kind === 'measurement';
}

/** The steps with this one moved by `by` places. */
export function moveStep(drafts: readonly StepDraft[], index: number, by: 1 | -1): StepDraft[] {
  const moved = [...drafts];
  const [step] = moved.splice(index, 1);
  moved.splice(index + by, 0, step!);
  return moved;
}

/** The key of each step by row: a step keeps its own, a new one gets one from its title. */
function nameSteps(drafts: readonly StepDraft[]): Map<number, string> {
  const taken = new Set(drafts.map(({ key }) => key).filter(Boolean));
  return new Map(
    drafts.map(({ row, key, title }) => {
      if (key) return [row, key];
      const slug = slugOf(title);
      let name = slug;
      for (let number = 2; taken.has(name); number += 1) name = `${slug}-${number}`;
      taken.add(name);
      return [row, name];
    }),
  );
}

function slugOf(title: string): string {
  const words =
    title
      .toLowerCase()
      .normalize('NFD')
      .replaceAll(/\p{M}/gu, '')
      .match(/[a-z0-9]+/g) ?? [];
  return words.join('-').slice(0, 50).replace(/-$/, '') || 'step';
}
