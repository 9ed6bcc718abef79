import type { FieldError } from '@/lib/errors';
import type { Failure } from './api';

/**
 * What stands above a form: every field that was refused, by the name it has on screen, or what the failure says as a
 * whole. `labels` maps a field's path to that name; a path below a field ("season.from") may have its own.
 */
export function listErrors(failure: Failure | null, labels: Readonly<Record<string, string>>): FieldError[] {
  if (!failure) return [];
  if (failure.errors.length === 0) return [{ path: '', message: failure.detail }];
  return failure.errors.map(({ path, message }) => {
    const label = labels[path];
    return label ? { path, message: `${label}: ${message}` } : { path: '', message };
  });
}
