import { env } from '@/lib/env';
import { Refusal } from '@/lib/errors';

/**
 * Refuses a write that a browser sent from a page of another site: Fetch Metadata first, the Origin header where
 * a browser does not send it. A caller without either is no browser, and holds the cookie by other means.
 * Throws `cross_site`.
 */
export function checkSameSite(request: Request): void {
  if (request.method === 'GET' || request.method === 'HEAD') return;
  const site = request.headers.get('sec-fetch-site');
  const origin = request.headers.get('origin');
  const foreign = site
    ? site !== 'same-origin' && site !== 'none'
    : origin !== null && !isOurs(origin, request);
  if (foreign) throw new Refusal('cross_site', 'This was sent from a page of another site.');
}

function isOurs(origin: string, request: Request): boolean {
  return origin === new URL(env().PUBLIC_URL).origin || origin === `http://${request.headers.get('host')}`;
}
