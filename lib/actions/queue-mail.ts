import { insertMail } from '@/db/queries/mail';
import type { Context } from '@/lib/context';
import { enqueue } from '@/lib/enqueue';

/** A letter as it is to be sent. `kind` says what it is for; `headers` go beside the usual ones. */
export type Letter = {
  kind: 'invitation' | 'password-reset' | 'password-changed' | 'digest';
  to: string;
  subject: string;
  text: string;
  html?: string;
  headers?: Record<string, string>;
};

/**
 * Stores the letter and puts its sending on the worker's queue, both in the caller's transaction: what is rolled
 * back is never sent, and a mail server that is down delays nobody. Answers the letter's id.
 */
export async function queueMail(ctx: Pick<Context, 'db' | 'now'>, letter: Letter): Promise<string> {
  const mailId = await insertMail(ctx.db, {
    kind: letter.kind,
    recipient: letter.to,
    subject: letter.subject,
    text_body: letter.text,
    html_body: letter.html ?? null,
    headers: JSON.stringify(letter.headers ?? {}),
    queued_at: ctx.now,
  });
  await enqueue(ctx.db, 'send-mail', { mailId });
  return mailId;
}
