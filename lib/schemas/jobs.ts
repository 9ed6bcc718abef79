import { z } from 'zod';

/** Every kind of job and its payload. The worker's task of the same name parses it and calls one action. */
export const jobs = {
  'refresh-due': z.object({ unitIds: z.array(z.uuid()).min(1) }),
  'refresh-fleet': z.object({}),
  'open-tasks': z.object({}),
  'send-mail': z.object({ mailId: z.uuid() }),
  'send-password-reset': z.object({ id: z.uuid(), email: z.string() }),
  'tick-digests': z.object({}),
  'send-digest': z.object({ personId: z.uuid(), weekOn: z.iso.date() }),
  tidy: z.object({}),
  'sweep-files': z.object({}),
} as const;

export type JobName = keyof typeof jobs;
export type JobPayload<N extends JobName> = z.output<(typeof jobs)[N]>;
