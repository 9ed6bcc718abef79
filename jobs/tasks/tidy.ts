import { tidy } from '@/lib/actions/tidy';
import type { JobRun } from '../run';

export const run: JobRun = (ctx) => tidy(ctx);
