import type { FieldError } from '@/lib/errors';

/** What a request that did not succeed says. `code` is one of the API's, `fault`, or `connection_lost`. */
export type Failure = {
  ok: false;
  code: string;
  detail: string;
  errors: readonly FieldError[];
};
export type Answer<T> = { ok: true; data: T } | Failure;

type Method = 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';

/** A request that got no answer: it may or may not have been carried out. */
export const LOST: Failure = {
  ok: false,
  code: 'connection_lost',
  detail: 'No answer from the server. Check the connection and try again.',
  errors: [],
};

/**
 * Sends `body` as JSON to a path of the API (`/api/v1/…`) as the signed-in person. Never throws: a refusal is
 * answered with its code, its sentence and the fields it names, a lost connection as `connection_lost`.
 */
export async function send<T>(method: Method, path: string, body?: unknown): Promise<Answer<T>> {
  let response: Response;
  try {
    response = await fetch(path, {
      method,
      credentials: 'same-origin',
      headers: {
        accept: 'application/json',
        ...(body !== undefined && { 'content-type': 'application/json' }),
      },
      ...(body !== undefined && { body: JSON.stringify(body) }),
    });
  } catch {
    return LOST;
  }
  return readAnswer<T>(response);
}

async function readAnswer<T>(response: Response): Promise<Answer<T>> {
  try {
    return toAnswer<T>(response.ok, await response.text());
  } catch {
    return response.ok ? LOST : toFailure(null);
  }
}

/** What came back, from its text; a success that cannot be read is a lost answer. */
export function toAnswer<T>(ok: boolean, text: string): Answer<T> {
  try {
    const json: unknown = text ? JSON.parse(text) : null;
    return ok ? { ok: true, data: json as T } : toFailure(json);
  } catch {
    return ok ? LOST : toFailure(null);
  }
}

function toFailure(json: unknown): Failure {
  const problem = (typeof json === 'object' && json !== null ? json : {}) as Partial<Failure>;
  return {
    ok: false,
    code: typeof problem.code === 'string' ? problem.code : 'fault',
    detail:
      typeof problem.detail === 'string'
        ? problem.detail
        : 'The server could not answer. Try again; if it comes back, tell whoever runs it.',
    errors: Array.isArray(problem.errors) ? problem.errors : [],
  };
}

/** What the failure says about one field, or undefined. The first message wins. */
export function fieldError(failure: Failure | null, path: string): string | undefined {
  return failure?.errors.find((error) => error.path === path)?.message;
}

/** What of the failure belongs to none of the named fields: the sentence to show above the form, or undefined. */
export function formError(failure: Failure | null, fields: readonly string[]): string | undefined {
  if (!failure) return undefined;
  const elsewhere = failure.errors.filter((error) => !fields.includes(error.path));
  if (failure.errors.length === 0) return failure.detail;
  return elsewhere.length > 0 ? elsewhere.map((error) => error.message).join('; ') : undefined;
}

/** What a form itself refuses, in the shape of the API's refusals. */
export function refusedHere(errors: Failure['errors']): Failure {
  return { ok: false, code: 'invalid_input', detail: errors.map(({ message }) => message).join(' '), errors };
}
