import { randomBytes } from 'node:crypto';

/** A name for a file that nobody guesses and that says nothing: 128 random bits in hexadecimal. */
export const randomKey = (): string => randomBytes(16).toString('hex');
