import type { z } from 'zod';
import { Refusal, type FieldError } from '@/lib/errors';

/** The largest JSON body that is read, in bytes. Photos and documents do not travel this way. */
export const MAX_BODY_BYTES = 256 * 1024;

/**
 * The request's JSON, never reading more than `MAX_BODY_BYTES`.
 * Throws `too_large`, `unsupported_media_type` or `malformed_json`.
 */
export async function readJson(request: Request): Promise<unknown> {
  const type = request.headers.get('content-type') ?? '';
  if (!/^application\/(?:[\w.+-]+\+)?json\b/i.test(type)) {
    throw new Refusal('unsupported_media_type', 'Send JSON, with the header Content-Type: application/json.');
  }
  const text = await readText(request);
  try {
    return JSON.parse(text) as unknown;
  } catch {
    throw new Refusal('malformed_json', 'The body is not JSON.', [{ path: '', message: 'is not JSON' }]);
  }
}

/** The request's body as text. Throws `too_large` beyond `MAX_BODY_BYTES`. */
export async function readText(request: Request): Promise<string> {
  const tooLarge = new Refusal('too_large', `A body is at most ${MAX_BODY_BYTES / 1024} KiB.`);
  return new TextDecoder().decode(await readAtMost(request, MAX_BODY_BYTES, tooLarge));
}

/** The request's body, never reading more than `most` bytes. Throws `tooLarge` beyond that. */
export async function readAtMost(request: Request, most: number, tooLarge: Refusal): Promise<Buffer> {
  if (Number(request.headers.get('content-length') ?? 0) > most) throw tooLarge;
  if (!request.body) return Buffer.alloc(0);
  const chunks: Uint8Array[] = [];
  let bytes = 0;
  const reader = request.body.getReader();
  for (;;) {
    const { done, value } = await reader.read();
    if (done) return Buffer.concat(chunks);
    bytes += value.byteLength;
    if (bytes > most) {
      await reader.cancel();
      throw tooLarge;
    }
    chunks.push(value);
  }
}

/** The value as the schema has it. Throws `invalid_input` with every field that is wrong, by its path. */
export function parseWith<T extends z.ZodType>(schema: T, value: unknown): z.output<T> {
  const parsed = schema.safeParse(value);
  if (parsed.success) return parsed.data;
  const errors = parsed.error.issues.flatMap(fieldErrors);
  throw new Refusal(
    'invalid_input',
    errors.map((e) => (e.path ? `${e.path}: ${e.message}` : e.message)).join('; '),
    errors,
  );
}

function fieldErrors(issue: z.core.$ZodIssue): FieldError[] {
  if (issue.code === 'unrecognized_keys') {
    return issue.keys.map((key) => ({
      path: [...issue.path, key].join('.'),
      message: 'is not a field of this',
    }));
  }
  return [{ path: issue.path.join('.'), message: issue.message }];
}
