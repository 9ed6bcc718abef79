import { z } from 'zod';

/** An error as every route answers it, after RFC 9457: `code` is of a closed set, `path` is dotted. */
export const problem = z.object({
  type: z.string(),
  title: z.string(),
  status: z.int(),
  detail: z.string(),
  code: z.string(),
  errors: z.array(z.object({ path: z.string(), message: z.string() })),
});
