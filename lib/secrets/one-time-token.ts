import { createHash, randomBytes } from 'node:crypto';

/** A secret of 256 bits for a link, a device or a key: given away once, and only its SHA-256 is kept. */
export function makeToken(): { token: string; hash: Buffer } {
  const token = randomBytes(32).toString('base64url');
  return { token, hash: hashToken(token) };
}

/** What is kept of a token. It is random, so one fast hash is enough. */
export function hashToken(token: string): Buffer {
  return createHash('sha256').update(token).digest();
}
