import { randomUUID } from 'node:crypto';
import { hash, verify } from '@node-rs/argon2';

/** argon2id (the library's default) with 19 MiB, two passes, one lane: OWASP's first choice. About 30 ms. */
const COST = { memoryCost: 19_456, timeCost: 2, parallelism: 1 } as const;

/** What is compared against when there is no such person, so that the answer takes as long. */
const nobodysHash = hash(randomUUID(), COST);

/** The password as it is kept, salted. */
export function hashPassword(password: string): Promise<string> {
  return hash(password.normalize('NFC'), COST);
}

/** Whether the password is the one that was hashed; without a hash it takes as long and is false. */
export async function verifyPassword(passwordHash: string | null, password: string): Promise<boolean> {
  const matches = await verify(passwordHash ?? (await nobodysHash), password.normalize('NFC'), COST);
  return passwordHash !== null && matches;
}
