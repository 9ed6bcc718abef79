import { Readable } from 'node:stream';
import { createTransport, type Transporter } from 'nodemailer';
import type { Deliver, Delivery } from '@/lib/actions/send-mail';
import type { MailClaim } from '@/lib/actions/keep-mail-claim';

/** What a mail server may take its time over. It may greet late on purpose; nobody waits for our jobs that long. */
const TIME_LIMITS = { connectionTimeout: 10_000, greetingTimeout: 30_000, socketTimeout: 60_000 };

/**
 * Hands letters to the server at `smtpUrl`. A letter's Message-ID is made from its row's id, so that one that was
 * sent twice after all is one letter to a mail program that looks. Answers `refused` when the server said so for
 * good (5xx, about the letter), `not-now` for everything else. Never throws.
 */
export function createDeliver({ smtpUrl, from }: { smtpUrl: string; from: string }): Deliver {
  return async (letter, claim) => {
    const transport = createTransport({ ...TIME_LIMITS, url: smtpUrl });
    transport.use('stream', holdBodyBack(claim));
    try {
      await transport.sendMail({
        from,
        to: letter.recipient,
        subject: letter.subject,
        text: letter.text_body,
        html: letter.html_body ?? undefined,
        headers: { 'Auto-Submitted': 'auto-generated', ...letter.headers },
        messageId: messageId(letter.id, from),
        date: letter.queued_at,
        disableFileAccess: true,
        disableUrlAccess: true,
        signal: claim.signal,
      });
      return { outcome: 'sent' };
    } catch (error) {
      return toDelivery(error);
    } finally {
      transport.close();
    }
  };
}

/** `<id@domain of the sender>`, after RFC 5322 section 3.6.4. */
export function messageId(mailId: string, from: string): string {
  const domain = /@([^\s<>@]+)>?$/.exec(from)?.[1] ?? 'localhost';
  return `<${mailId}@${domain}>`;
}

type Plugin = Parameters<Transporter['use']>[1];

/**
 * The body's first octet is asked for when the server waits for it. Whoever lost the claim by then (its process
 * stood still, say) breaks off, and the server, which has seen no end of the letter, throws it away.
 */
function holdBodyBack(claim: MailClaim): Plugin {
  return ({ message }, done) => {
    const create = message.createReadStream.bind(message);
    message.createReadStream = (options) => Readable.from(held(() => create(options), claim));
    done();
  };
}

async function* held(open: () => Readable, claim: MailClaim): AsyncGenerator<Buffer> {
  if (!claim.holds()) throw new Error('the claim on the letter was lost');
  for await (const chunk of open()) yield chunk as Buffer;
}

type SmtpError = Error & { code?: string; command?: string; responseCode?: number };

/** RFC 5321 section 4.2.1: 5yz is final, 4yz is not. A log-in that fails is the operator's to mend, so it is not. */
function toDelivery(error: unknown): Delivery {
  const { message, code = '', command = '', responseCode } = error as SmtpError;
  const refused =
    responseCode === undefined
      ? ['EENVELOPE', 'EMESSAGE'].includes(code)
      : responseCode >= 500 && ['MAIL FROM', 'RCPT TO', 'DATA'].includes(command);
  return { outcome: refused ? 'refused' : 'not-now', why: message.slice(0, 500) };
}
