import { createHash, timingSafeEqual } from 'node:crypto';
import { env } from '@/lib/env';
import { refuseField } from '@/lib/errors';

/** Throws `forbidden` on `token` unless it is the one printed when the server was started. */
export function checkSetupToken(token: string): void {
  const expected = env().SETUP_TOKEN;
  if (!expected) {
    throw refuseField(
      'token',
      'The server was started without a set-up token. Start it again on an empty database.',
      'forbidden',
    );
  }
  if (!timingSafeEqual(digest(token), digest(expected))) {
    throw refuseField('token', 'is not the token printed at start', 'forbidden');
  }
}

const digest = (text: string) => createHash('sha256').update(text).digest();
