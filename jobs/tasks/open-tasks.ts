import { openTasks } from '@/lib/actions/open-tasks';
import type { JobRun } from '../run';

export const run: JobRun = async (ctx) => {
  await openTasks(ctx, 'all');
};
