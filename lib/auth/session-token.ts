import { createHmac, hkdfSync, timingSafeEqual } from 'node:crypto';

/** What a session cookie says, and all it says: which session, and until when (seconds since 1970). */
export type SessionToken = { sessionId: string; expiresAtSeconds: number };

const SHAPE = /^([0-9a-f-]{36})\.([0-9a-z]{1,9})\.([A-Za-z0-9_-]{43})$/;
const keys = new Map<string, Buffer>();

/**
 * The cookie's value: `<session id>.<expiry, base 36>.<HMAC-SHA-256 of both>`. Nothing in it is secret, so it is
 * signed and not encrypted: reading it costs microseconds at every request.
 */
export function signSessionToken(token: SessionToken, secret: string): string {
  const said = `${token.sessionId}.${token.expiresAtSeconds.toString(36)}`;
  return `${said}.${mac(said, secret)}`;
}

/** What a cookie says when we signed it and it has not expired (`now` < expiry); null otherwise. */
export function readSessionToken(cookie: string, secret: string, now: Date): SessionToken | null {
  const [, sessionId, expiry, given] = SHAPE.exec(cookie) ?? [];
  if (!sessionId || !expiry || !given) return null;
  const expected = Buffer.from(mac(`${sessionId}.${expiry}`, secret));
  if (!timingSafeEqual(Buffer.from(given), expected)) return null;
  const expiresAtSeconds = parseInt(expiry, 36);
  return now.getTime() < expiresAtSeconds * 1000 ? { sessionId, expiresAtSeconds } : null;
}

function mac(said: string, secret: string): string {
  return createHmac('sha256', keyOf(secret)).update(said).digest('base64url');
}

/** A key for this use alone, so that no other use of the secret can make a cookie. */
function keyOf(secret: string): Buffer {
  let key = keys.get(secret);
  if (!key) {
    key = Buffer.from(hkdfSync('sha256', secret, '', 'wakewright session token', 32));
    keys.set(secret, key);
  }
  return key;
}
