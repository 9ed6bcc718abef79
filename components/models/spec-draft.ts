import type { Failure } from '@/lib/client/api';
import type { Model, Spec } from '@/lib/schemas/model';

/** One spec as it is typed; `key` tells rows apart while names change. */
export type SpecDraft = { key: number; name: string; min: string; target: string; max: string; unit: string };

const LIMITS = ['min', 'target', 'max'] as const;

/** A model's specs as rows to type in, in their order. */
export function draftSpecs(specs: Model['specs']): SpecDraft[] {
  return Object.entries(specs).map(([name, spec], key) => ({
    key,
    name,
    min: spec.min?.toString() ?? '',
    target: spec.target?.toString() ?? '',
    max: spec.max?.toString() ?? '',
    unit: spec.unit ?? '',
  }));
}

/**
 * The rows as the API takes them, those left empty left out. Answers what cannot be sent at all instead: a row
 * without a name, or two of one name; the path is the row's field.
 */
export function readSpecs(
  rows: readonly SpecDraft[],
): { specs: Model['specs'] } | { errors: Failure['errors'] } {
  const filled = rows.filter((row) =>
    [row.name, row.min, row.target, row.max, row.unit].some((text) => text.trim()),
  );
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

/** Text that is no number goes as it is, for the API to refuse by name. */
function readSpec(row: SpecDraft): Spec {
  const limits = LIMITS.flatMap((field) => {
    const text = row[field].trim().replace(',', '.');
    if (text === '') return [];
    return [[field, Number.isFinite(Number(text)) ? Number(text) : text]];
  });
  return { ...Object.fromEntries(limits), ...(row.unit.trim() && { unit: row.unit.trim() }) } as Spec;
}

/** Where the API's path of a spec stands on screen: 'specs.Compression.max' is 'spec.3.max'. */
export function specPath(path: string, rows: readonly SpecDraft[]): string {
  const row = rows.find(
    ({ name }) => path.startsWith(`specs.${name.trim()}.`) || path === `specs.${name.trim()}`,
  );
  if (!row) return path;
  const field = path.slice(`specs.${row.name.trim()}.`.length);
  return `spec.${row.key}.${field || 'name'}`;
}
