import { createHmac, hkdfSync } from 'node:crypto';
import { describe, expect, test } from 'vitest';
import { readSessionToken, signSessionToken } from '@/lib/auth/session-token';

const secret = 'a secret of thirty-two characters or more';
const sessionId = '6f1d0a3e-5b64-4f0e-9a57-0d9be2f6f001';
const expiresAtSeconds = Date.parse('2026-07-18T10:00:00Z') / 1000;
const cookie = signSessionToken({ sessionId, expiresAtSeconds }, secret);
const before = new Date('2026-07-18T09:59:59.999Z');

describe('the session cookie', () => {
  test('says which session and until when', () => {
    expect(readSessionToken(cookie, secret, before)).toEqual({ sessionId, expiresAtSeconds });
  });

  test('is signed as RFC 2104 and RFC 5869 say, worked anew here', () => {
    const key = Buffer.from(hkdfSync('sha256', secret, '', 'wakewright session token', 32));
    const said = `${sessionId}.${expiresAtSeconds.toString(36)}`;
    expect(cookie).toBe(`${said}.${createHmac('sha256', key).update(said).digest('base64url')}`);
  });

  test('says nothing from its expiry on', () => {
    expect(readSessionToken(cookie, secret, new Date(expiresAtSeconds * 1000))).toBeNull();
  });

  test('says nothing when signed with another secret', () => {
    expect(readSessionToken(cookie, `${secret}!`, before)).toBeNull();
  });

  test('says nothing when any one character is another', () => {
    for (let index = 0; index < cookie.length - 1; index += 1) {
      const other = cookie[index] === 'a' ? 'b' : 'a';
      const forged = cookie.slice(0, index) + other + cookie.slice(index + 1);
      expect(readSessionToken(forged, secret, before), `character ${index}`).toBeNull();
    }
  });

  test.each(['', '.', 'a.b.c', `${cookie}.`, `${cookie}A`, 'null'])(
    'says nothing when it is "%s"',
    (value) => {
      expect(readSessionToken(value, secret, before)).toBeNull();
    },
  );
});
