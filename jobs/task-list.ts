import type { JobName } from '@/lib/schemas/jobs';
import type { JobRun } from './run';
import { run as openTasks } from './tasks/open-tasks';
import { run as refreshDue } from './tasks/refresh-due';
import { run as sendMail } from './tasks/send-mail';

/** What runs each kind of job. */
export const TASKS: Partial<Record<JobName, JobRun>> = {
  'refresh-due': refreshDue,
  'open-tasks': openTasks,
  'send-mail': sendMail,
};
