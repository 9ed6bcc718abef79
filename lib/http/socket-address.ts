import type { IncomingMessage } from 'node:http';
import { env } from '@/lib/env';

/**
 * Puts the socket's own address into `X-Forwarded-For` of every request before anybody reads it, unless the
 * environment says that a proxy in front of us writes that header. A route has no other way to the socket, and the
 * framework keeps whatever the caller wrote.
 */
export function writeSocketAddress(): void {
  if (env().TRUST_PROXY > 0) return;
  // Not imported: the framework also compiles this for a runtime that has no such module, and never runs it there.
  const { subscribe } = process.getBuiltinModule('node:diagnostics_channel');
  subscribe('http.server.request.start', (message) => {
    const { request } = message as { request: IncomingMessage };
    request.headers['x-forwarded-for'] = request.socket.remoteAddress ?? 'unknown';
  });
}
