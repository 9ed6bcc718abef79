import { sweepFiles } from '@/lib/actions/sweep-files';
import { objectStore } from '@/lib/storage/object-store';
import type { JobRun } from '../run';

export const run: JobRun = async (ctx) => {
  await sweepFiles(ctx, objectStore);
};
