import { env } from '@/lib/env';

/** Whether people open us by https, so that cookies may be kept off plain http. */
export function usesSecureCookies(): boolean {
  return env().PUBLIC_URL.startsWith('https:');
}

/**
 * The name under which next-auth keeps the session: `3000.next-auth.session-token` at `http://127.0.0.1:3000`. A
 * browser tells cookies of one host apart by name and not by port, and two checkouts would sign each other out. The
 * port is in front, for next-auth takes a cookie whose name only goes on after ours for a part of it.
 */
export function sessionCookieName(publicUrl = env().PUBLIC_URL): string {
  const { protocol, port } = new URL(publicUrl);
  return `${protocol === 'https:' ? '__Secure-' : ''}${port && `${port}.`}next-auth.session-token`;
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
