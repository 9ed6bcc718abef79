import { tickDigests } from '@/lib/actions/tick-digests';
import type { JobRun } from '../run';

export const run: JobRun = (ctx) => tickDigests(ctx);
