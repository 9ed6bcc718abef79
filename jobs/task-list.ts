import type { JobName } from '@/lib/schemas/jobs';
import type { JobRun } from './run';
import { run as openTasks } from './tasks/open-tasks';
import { run as refreshDue } from './tasks/refresh-due';
import { run as refreshFleet } from './tasks/refresh-fleet';
import { run as sendDigest } from './tasks/send-digest';
import { run as sendMail } from './tasks/send-mail';
import { run as sendPasswordReset } from './tasks/send-password-reset';
import { run as sweepFiles } from './tasks/sweep-files';
import { run as tickDigests } from './tasks/tick-digests';
import { run as tidy } from './tasks/tidy';

/** What runs each kind of job. */
export const TASKS: Record<JobName, JobRun> = {
  'refresh-due': refreshDue,
  'refresh-fleet': refreshFleet,
  'open-tasks': openTasks,
  'send-mail': sendMail,
  'send-password-reset': sendPasswordReset,
  'tick-digests': tickDigests,
  'send-digest': sendDigest,
  tidy,
  'sweep-files': sweepFiles,
};
