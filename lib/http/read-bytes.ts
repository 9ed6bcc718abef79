import { refuseField } from '@/lib/errors';
import { MAX_FILE_BYTES } from '@/lib/schemas/attachment';
import { readAtMost } from './body';

/** Files that are taken in at a time; the others wait, so that memory stays bounded. */
const AT_A_TIME = 2;
let running = 0;
const waiting: (() => void)[] = [];

/** Runs one of few at a time: taking in a file holds it in memory. Whoever is done hands their turn to the next. */
export async function takingTurns<T>(work: () => Promise<T>): Promise<T> {
  if (running < AT_A_TIME) running += 1;
  else await new Promise<void>((resolve) => waiting.push(resolve));
  try {
    return await work();
  } finally {
    const next = waiting.shift();
    if (next) next();
    else running -= 1;
  }
}

/** The request's body as bytes, never reading more than `MAX_FILE_BYTES`. Throws `too_large` on `file`. */
export function readBytes(request: Request): Promise<Buffer> {
  const message = `is larger than ${MAX_FILE_BYTES / 1024 / 1024} MB`;
  return readAtMost(request, MAX_FILE_BYTES, refuseField('file', message, 'too_large'));
}
