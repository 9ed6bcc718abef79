import { sendDigest } from '@/lib/actions/send-digest';
import { jobs } from '@/lib/schemas/jobs';
import type { JobRun } from '../run';

export const run: JobRun = (ctx, payload) => sendDigest(ctx, jobs['send-digest'].parse(payload));
