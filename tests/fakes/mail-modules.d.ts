/** The parts used here of two packages that ship without types. */
declare module 'smtp-server' {
  import type { Readable } from 'node:stream';

  interface Session {
    envelope: { mailFrom: { address: string } | false; rcptTo: { address: string }[] };
  }
  type Done = (error?: Error | null) => void;
  interface Options {
    authOptional?: boolean;
    disabledCommands?: string[];
    banner?: string;
    onConnect?(session: Session, done: Done): void;
    onRcptTo?(address: { address: string }, session: Session, done: Done): void;
    onData?(stream: Readable, session: Session, done: Done): void;
  }
  export class SMTPServer {
    constructor(options: Options);
    listen(port: number, host: string, ready: () => void): unknown;
    close(done: () => void): void;
    server: import('node:net').Server;
    on(event: 'error', listener: (error: Error) => void): this;
  }
}

declare module 'mailparser' {
  interface Parsed {
    subject?: string;
    text?: string;
    html?: string | false;
    messageId?: string;
    from?: { text: string };
    to?: { text: string } | { text: string }[];
    headerLines: readonly { key: string; line: string }[];
  }
  export function simpleParser(source: Uint8Array | string): Promise<Parsed>;
}
