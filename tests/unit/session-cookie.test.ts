import { expect, test } from 'vitest';
import { sessionCookieName } from '@/lib/auth/cookies';

// RFC 6265 section 8.5: cookies do not provide isolation by port.
test.each([
  ['http://127.0.0.1:3000', '3000.next-auth.session-token'],
  ['http://127.0.0.1:30001', '30001.next-auth.session-token'],
  ['https://fleet.example', '__Secure-next-auth.session-token'],
  ['https://fleet.example:8443', '__Secure-8443.next-auth.session-token'],
])('a session at %s is kept as %s', (address, name) => {
  expect(sessionCookieName(address)).toBe(name);
});
