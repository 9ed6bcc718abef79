import { env } from '@/lib/env';

/** Whether people open us by https, so that cookies may be kept off plain http. */
export function usesSecureCookies(): boolean {
  return env().PUBLIC_URL.startsWith('https:');
}

/** The name under which next-auth keeps the session. */
export function sessionCookieName(): string {
  return usesSecureCookies() ? '__Secure-next-auth.session-token' : 'next-auth.session-token';
}

/** The name under which a browser keeps what makes it a known device. */
export function deviceCookieName(): string {
  return usesSecureCookies() ? '__Host-known-device' : 'known-device';
}

/** One cookie out of a `Cookie` header, as it was sent; null when it is not there. */
export function readCookie(header: string | null, name: string): string | null {
  if (!header) return null;
  const start = `${name}=`;
  for (const part of header.split(';')) {
    const pair = part.trim();
    if (pair.startsWith(start)) return pair.slice(start.length);
  }
  return null;
}
