import type { Context } from '@/lib/context';
import type { Env } from '@/lib/env';

/** What a job's file exports: a few lines that parse the payload and call one action, as the system. */
export type JobRun = (ctx: Context, payload: unknown, env: Env) => Promise<void>;
