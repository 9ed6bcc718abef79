import { createHash } from 'node:crypto';

/** A name for something that is counted but must not be readable where it is kept, such as a mistyped password. */
export function privateKey(text: string): string {
  return createHash('sha256').update(text).digest('hex');
}
