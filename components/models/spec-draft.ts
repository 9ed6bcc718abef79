import type { Failure } from '@/lib/client/api';
import type { Model, Spec } from '@/lib/schemas/model';

/** One spec as it is typed; `key` tells rows apart while names change. */
export type SpecDraft = {
  key: number;
  name: string;
  min: string;
  target: string;
  max: string;
  unit: string;
  repeats: string;
  /** How far apart: an amount in the spec's unit, or a percentage as '10 %'. */
  maxSpread: string;
  maxDifference: string;
};

const LIMITS = ['min', 'target', 'max', 'repeats'] as const;
const ALLOWANCES = ['maxSpread', 'maxDifference'] as const;
const TEXTS = [...LIMITS, ...ALLOWANCES, 'name', 'unit'] as const;

/** A model's specs as rows to type in, in their order. */
export function draftSpecs(specs: Model['specs']): SpecDraft[] {
  return Object.entries(specs).map(([name, spec], key) => ({
    key,
    name,
    min: spec.min?.toString() ?? '',
    target: spec.target?.toString() ?? '',
    max: spec.max?.toString() ?? '',
    unit: spec.unit ?? '',
    repeats: spec.repeats?.toString() ?? '',
    maxSpread: allowanceText(spec.maxSpread),
    maxDifference: allowanceText(spec.maxDifference),
  }));
}

/**
 * The rows as the API takes them, those left empty left out. Answers what cannot be sent at all instead: a row
 * without a name, or two of one name; the path is the row's field.
 */
export function readSpecs(
  rows: readonly SpecDraft[],
): { specs: Model['specs'] } | { errors: Failure['errors'] } {
  const filled = rows.filter((row) => TEXTS.some((field) => row[field].trim()));
  const errors = filled.flatMap((row) => {
    const name = row.name.trim();
    const path = `spec.${row.key}.name`;
    if (name === '') return [{ path, message: 'Name this spec, or empty its row.' }];
    const twin = filled.find((other) => other.name.trim() === name && other.key < row.key);
    return twin ? [{ path, message: `Two specs are called ${name}.` }] : [];
  });
  if (errors.length > 0) return { errors };
  return { specs: Object.fromEntries(filled.map((row) => [row.name.trim(), readSpec(row)])) };
}

const allowanceText = (allowed: Spec['maxSpread']) =>
  allowed ? `${allowed.amount}${allowed.of === 'percent' ? ' %' : ''}` : '';

/** Text that is no number goes as it is, for the API to refuse by name. */
function readNumber(text: string): number | string {
  const number = text.trim().replace(',', '.');
  return Number.isFinite(Number(number)) ? Number(number) : number;
}

function readSpec(row: SpecDraft): Spec {
  const limits = LIMITS.flatMap((field) => (row[field].trim() ? [[field, readNumber(row[field])]] : []));
  const allowances = ALLOWANCES.flatMap((field) => {
    const text = row[field].trim();
    if (text === '') return [];
    const percent = text.endsWith('%');
    const amount = readNumber(percent ? text.slice(0, -1) : text);
    return [[field, { amount, of: percent ? 'percent' : 'unit' }]];
  });
  const unit = row.unit.trim();
  return { ...Object.fromEntries([...limits, ...allowances]), ...(unit && { unit }) } as Spec;
}

/** Where the API's path of a spec stands on screen: 'specs.Compression.max' is 'spec.3.max'. */
export function specPath(path: string, rows: readonly SpecDraft[]): string {
  const row = rows.find(
    ({ name }) => path.startsWith(`specs.${name.trim()}.`) || path === `specs.${name.trim()}`,
  );
  if (!row) return path;
  const field = path.slice(`specs.${row.name.trim()}.`.length);
  return `spec.${row.key}.${field.split('.')[0] || 'name'}`;
}

/** A refusal with each field of a spec at the row it is typed in. */
export function showSpecs(failure: Failure | null, rows: readonly SpecDraft[]): Failure | null {
  if (!failure) return null;
  return {
    ...failure,
    errors: failure.errors.map((each) => ({ ...each, path: specPath(each.path, rows) })),
  };
}

/** Each field of a spec by the measurement's name. */
export function specLabels(rows: readonly SpecDraft[]): Record<string, string> {
  return Object.fromEntries(
    rows.flatMap(({ key, name }) =>
      ['name', 'min', 'target', 'max', 'unit'].map((field) => [`spec.${key}.${field}`, name || 'Spec']),
    ),
  );
}
