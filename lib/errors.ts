/** One field of an input and what is wrong with it. `path` is dotted, as the caller sent it: `triggers.0.every`. */
export type FieldError = { path: string; message: string };

/** The closed set of reasons for which Wakewright refuses. `lib/http/problem.ts` maps each to HTTP, once. */
export type ErrorCode =
  | 'invalid_input'
  | 'malformed_json'
  | 'too_large'
  | 'unsupported_media_type'
  | 'not_signed_in'
  | 'forbidden'
  | 'cross_site'
  | 'not_found'
  | 'method_not_allowed'
  | 'conflict'
  | 'unit_held'
  | 'unit_out'
  | 'reading_refused'
  | 'reason_needed'
  | 'too_many_attempts'
  | 'already_set_up'
  | 'unavailable';

/**
 * A refusal with a code, a sentence for a person, and the fields it concerns. Everything that an action refuses
 * is thrown as one of these; anything else that escapes is a fault of ours and answered as 500.
 */
export class Refusal extends Error {
  readonly code: ErrorCode;
  readonly errors: readonly FieldError[];
  /** Whole seconds after which it is worth trying again; told as `Retry-After`. */
  readonly retryAfterSeconds: number | undefined;

  constructor(
    code: ErrorCode,
    message: string,
    errors: readonly FieldError[] = [],
    retryAfterSeconds?: number,
  ) {
    super(message);
    this.name = 'Refusal';
    this.code = code;
    this.errors = errors;
    this.retryAfterSeconds = retryAfterSeconds;
  }
}

/** An input refused for one field. */
export function refuseField(path: string, message: string, code: ErrorCode = 'invalid_input'): Refusal {
  return new Refusal(code, message, [{ path, message }]);
}
