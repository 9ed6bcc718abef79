import { SMTPServer } from 'smtp-server';
import { buffer } from 'node:stream/consumers';

type Reply = (error?: Error | null) => void;
/** At which step of the conversation, and how: hold on to `go` and the client waits. */
type Behaviour = Partial<Record<'greet' | 'recipient' | 'body', (go: Reply) => void>>;

export type MailServer = {
  url: string;
  /** The letters it took, whole. */
  taken: string[];
  behave(behaviour: Behaviour): void;
  stop(): Promise<void>;
};

const pass = (go: Reply) => go();

/** An answer of a mail server that refuses: 4xx for now, 5xx for good. */
export const refusal = (code: number, text: string) => Object.assign(new Error(text), { responseCode: code });

/** A mail server on loopback that a test can make late, rude or full. */
export async function startMailServer(): Promise<MailServer> {
  let behaviour: Behaviour = {};
  const taken: string[] = [];
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['STARTTLS'],
    onConnect: (_session, go) => (behaviour.greet ?? pass)(go),
    onRcptTo: (_address, _session, go) => (behaviour.recipient ?? pass)(go),
    onData: (stream, _session, go) => {
      buffer(stream).then(
        (raw) =>
          (behaviour.body ?? pass)((error) => {
            if (!error) taken.push(raw.toString('utf8'));
            go(error);
          }),
        // The client broke off before the end: nothing was received.
        () => undefined,
      );
    },
  });
  // A client that was killed or broke off is what these tests are about.
  server.on('error', () => undefined);
  const port = await new Promise<number>((resolve) =>
    server.listen(0, '127.0.0.1', () => resolve((server.server.address() as { port: number }).port)),
  );
  return {
    url: `smtp://127.0.0.1:${port}`,
    taken,
    behave: (next) => (behaviour = next),
    stop: () => new Promise((resolve) => server.close(() => resolve())),
  };
}
