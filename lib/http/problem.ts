import type { ErrorCode, FieldError } from '@/lib/errors';
import { Refusal } from '@/lib/errors';

const STATUS: Record<ErrorCode, number> = {
  invalid_input: 422,
  malformed_json: 400,
  too_large: 413,
  unsupported_media_type: 415,
  not_signed_in: 401,
  forbidden: 403,
  cross_site: 403,
  not_found: 404,
  method_not_allowed: 405,
  conflict: 409,
  unit_held: 409,
  unit_out: 409,
  reading_refused: 422,
  reason_needed: 422,
  too_many_attempts: 429,
  already_set_up: 409,
  unavailable: 503,
};

const TITLE: Record<ErrorCode, string> = {
  invalid_input: 'Something in what was sent is not right',
  malformed_json: 'The body is not JSON',
  too_large: 'The body is too large',
  unsupported_media_type: 'The body must be JSON',
  not_signed_in: 'Sign in first',
  forbidden: 'Not allowed',
  cross_site: 'Sent from another site',
  not_found: 'Not found',
  method_not_allowed: 'Not possible here',
  conflict: 'Somebody else was quicker, or it is there already',
  unit_held: 'The unit is held',
  unit_out: 'The unit is out',
  reading_refused: 'The reading cannot be right',
  reason_needed: 'A reason is needed',
  too_many_attempts: 'Too many attempts',
  already_set_up: 'Already set up',
  unavailable: 'Not available now',
};

/** The body of an error, after RFC 9457. */
export type Problem = {
  type: string;
  title: string;
  status: number;
  detail: string;
  code: ErrorCode | 'fault';
  errors: readonly FieldError[];
};

/** A refusal, or a fault of ours, as an RFC 9457 answer. A fault tells the caller nothing but that it was one. */
export function problemResponse(error: unknown): Response {
  const problem = problemOf(error);
  const wait = error instanceof Refusal ? error.retryAfterSeconds : undefined;
  return new Response(JSON.stringify(problem), {
    status: problem.status,
    headers: {
      'content-type': 'application/problem+json',
      'cache-control': 'no-store',
      ...(wait !== undefined && { 'retry-after': String(wait) }),
    },
  });
}

/** What an error tells the caller. */
export function problemOf(error: unknown): Problem {
  if (error instanceof Refusal) {
    const { code } = error;
    return {
      type: 'about:blank',
      title: TITLE[code],
      status: STATUS[code],
      detail: error.message,
      code,
      errors: error.errors,
    };
  }
  return {
    type: 'about:blank',
    title: 'A fault on our side',
    status: 500,
    detail: 'Nothing was changed. Try again; if it comes back, tell whoever runs this server.',
    code: 'fault',
    errors: [],
  };
}
