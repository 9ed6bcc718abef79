import { refreshFleet } from '@/lib/actions/refresh-fleet';
import type { JobRun } from '../run';

export const run: JobRun = async (ctx) => {
  const { units, changed } = await refreshFleet(ctx, { thorough: true });
  console.log(`nightly check: ${units} units, ${changed} due points changed (0 expected)`);
};
