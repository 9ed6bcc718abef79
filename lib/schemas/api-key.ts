import { z } from 'zod';
import { id, line } from './common';

export const createApiKey = z.strictObject({ name: line(80) });

export const apiKey = z.object({
  id,
  name: z.string(),
  prefix: z.string(),
  createdAt: z.string(),
  lastUsedAt: z.string().nullable(),
});

/** What is answered once, when a key is made: only its hash is kept. */
export const newApiKey = apiKey.extend({ key: z.string() });

export type CreateApiKey = z.output<typeof createApiKey>;
export type ApiKey = z.output<typeof apiKey>;
export type NewApiKey = z.output<typeof newApiKey>;
