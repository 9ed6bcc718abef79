import { jobs } from '@/lib/schemas/jobs';
import { refreshDue } from '@/lib/actions/refresh-due';
import type { JobRun } from '../run';

export const run: JobRun = async (ctx, payload) => {
  await refreshDue(ctx, jobs['refresh-due'].parse(payload));
};
