import { createServer, type IncomingMessage, type ServerResponse } from 'node:http';
import { buffer } from 'node:stream/consumers';
import { simpleParser } from 'mailparser';
import { SMTPServer } from 'smtp-server';
import { listPage, type Mail, mailPage } from './mailbox-pages';

export interface Mailbox {
  smtpUrl: string;
  webUrl: string;
  /** Newest first. */
  messages(): readonly Mail[];
  clear(): void;
  stop(): Promise<void>;
}

const KEPT = 500;

async function parseMail(raw: Buffer, envelopeTo: string[], id: number): Promise<Mail> {
  const parsed = await simpleParser(raw);
  return {
    id,
    receivedAt: new Date().toISOString(),
    from: parsed.from?.text ?? '',
    to: envelopeTo,
    subject: parsed.subject ?? '',
    text: parsed.text ?? '',
    html: parsed.html || '',
    headers: Object.fromEntries(
      parsed.headerLines.map(({ key, line }) => [
        key,
        line
          .slice(line.indexOf(':') + 1)
          .replace(/\r?\n[ \t]+/g, ' ')
          .trim(),
      ]),
    ),
    raw: raw.toString('utf8'),
  };
}

function answer(response: ServerResponse, status: number, type: string, body: string, policy?: string): void {
  response.writeHead(status, {
    'content-type': `${type}; charset=utf-8`,
    'cache-control': 'no-store',
    ...(policy ? { 'content-security-policy': policy } : {}),
  });
  response.end(body);
}

/** A mail may hold anything: it gets no script, no network and no way out but links in a new tab. */
const MAIL_POLICY =
  "sandbox allow-popups allow-popups-to-escape-sandbox; default-src 'none'; style-src 'unsafe-inline'; img-src data:";

function route(mails: Mail[], request: IncomingMessage, response: ServerResponse): void {
  const path = new URL(request.url ?? '/', 'http://mailbox').pathname;
  if (path === '/messages.json') {
    if (request.method === 'DELETE') mails.length = 0;
    return answer(response, 200, 'application/json', JSON.stringify(mails));
  }
  if (path === '/') return answer(response, 200, 'text/html', listPage(mails));
  const [, id, view] = /^\/messages\/(\d+)(?:\/(html|raw))?$/.exec(path) ?? [];
  const mail = mails.find((item) => item.id === Number(id));
  if (!mail)
    return answer(response, 404, 'text/plain', 'No such mail. It may be from before the last start.');
  if (view === 'raw') return answer(response, 200, 'text/plain', mail.raw);
  if (view === 'html')
    return answer(response, 200, 'text/html', `<base target="_blank">${mail.html}`, MAIL_POLICY);
  return answer(response, 200, 'text/html', mailPage(mail));
}

/**
 * A mail server on loopback that delivers to nobody: every mail lands on a page of its own. `GET /messages.json`
 * lists them, newest first; `DELETE` of the same empties the box. It holds the latest 500, in memory.
 */
export async function startMailbox(ports: { smtpPort?: number; webPort?: number } = {}): Promise<Mailbox> {
  const mails: Mail[] = [];
  let count = 0;
  const smtp = new SMTPServer({
    authOptional: true,
    disabledCommands: ['STARTTLS'],
    onData: (stream, session, done) => {
      const to = session.envelope.rcptTo.map(({ address }) => address);
      buffer(stream)
        .then((raw) => parseMail(raw, to, (count += 1)))
        .then((mail) => {
          mails.unshift(mail);
          mails.splice(KEPT);
          done();
        })
        .catch((error: unknown) => done(error as Error));
    },
  });
  smtp.on('error', (error) => console.error(`mailbox: ${error.message}`));
  const web = createServer((request, response) => route(mails, request, response));
  const smtpPort = await listening(
    (ready) => smtp.listen(ports.smtpPort ?? 0, '127.0.0.1', ready),
    smtpAddress(smtp),
  );
  const webPort = await listening(
    (ready) => web.listen(ports.webPort ?? 0, '127.0.0.1', ready),
    () => web.address(),
  );
  return {
    smtpUrl: `smtp://127.0.0.1:${smtpPort}`,
    webUrl: `http://127.0.0.1:${webPort}`,
    messages: () => mails,
    clear: () => void (mails.length = 0),
    stop: async () => {
      await new Promise<void>((resolve) => smtp.close(resolve));
      web.closeAllConnections();
      await new Promise((resolve) => web.close(resolve));
    },
  };
}

type Address = string | { port: number } | null;

const smtpAddress = (smtp: SMTPServer) => () => smtp.server.address();

async function listening(listen: (ready: () => void) => unknown, address: () => Address): Promise<number> {
  await new Promise<void>((resolve) => listen(resolve));
  const found = address();
  if (!found || typeof found === 'string') throw new Error('the mailbox has no port');
  return found.port;
}
