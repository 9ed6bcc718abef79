import { sendMail } from '@/lib/actions/send-mail';
import { createDeliver } from '@/lib/mail/deliver';
import { jobs } from '@/lib/schemas/jobs';
import { workerLimits } from '../limits';
import type { JobRun } from '../run';

export const run: JobRun = async (ctx, payload, env) => {
  const deliver = createDeliver({ smtpUrl: env.SMTP_URL, from: env.MAIL_FROM });
  await sendMail(ctx, jobs['send-mail'].parse(payload), { deliver, ...workerLimits(env.WORKER_BEAT_MS) });
};
