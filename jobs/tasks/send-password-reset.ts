import { sendPasswordReset } from '@/lib/actions/send-password-reset';
import { jobs } from '@/lib/schemas/jobs';
import type { JobRun } from '../run';

export const run: JobRun = (ctx, payload) =>
  sendPasswordReset(ctx, jobs['send-password-reset'].parse(payload));
