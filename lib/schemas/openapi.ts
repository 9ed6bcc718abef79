import { z } from 'zod';

/** An OpenAPI document, as far as our own needs to say what it is. */
export const openApi = z.looseObject({
  openapi: z.literal('3.1.1'),
  info: z.object({ title: z.string(), version: z.string(), description: z.string() }),
  paths: z.record(z.string(), z.record(z.string(), z.unknown())),
  components: z.record(z.string(), z.unknown()),
});

export type OpenApi = z.output<typeof openApi>;
