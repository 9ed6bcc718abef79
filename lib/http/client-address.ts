import { env } from '@/lib/env';

/**
 * The network address of whoever sent the request. `instrumentation.ts` sees to it that, without a proxy in front
 * of us, `X-Forwarded-For` is what the socket says and not what the caller wrote. Behind `TRUST_PROXY` proxies it
 * is the entry that the outermost of them added: that many from the right.
 */
export function clientAddress(headers: Headers): string {
  const entries = (headers.get('x-forwarded-for') ?? '').split(',').map((entry) => entry.trim());
  return entries.at(-Math.max(1, env().TRUST_PROXY)) || entries[0] || 'unknown';
}
