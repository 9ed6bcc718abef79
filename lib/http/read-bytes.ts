import { refuseField } from '@/lib/errors';
import { MAX_FILE_BYTES } from '@/lib/schemas/attachment';

/** Files that are taken in at a time; the others wait, so that memory stays bounded. */
const AT_A_TIME = 2;
let running = 0;
const waiting: (() => void)[] = [];

/** Runs one of few at a time: taking in a file holds it in memory. */
export async function takingTurns<T>(work: () => Promise<T>): Promise<T> {
  if (running >= AT_A_TIME) await new Promise<void>((resolve) => waiting.push(resolve));
  running += 1;
  try {
    return await work();
  } finally {
    running -= 1;
    waiting.shift()?.();
  }
}

/** The request's body as bytes, never reading more than `MAX_FILE_BYTES`. Throws `too_large` on `file`. */
export async function readBytes(request: Request): Promise<Buffer> {
  const tooLarge = () =>
    refuseField('file', `is larger than ${MAX_FILE_BYTES / 1024 / 1024} MB`, 'too_large');
  if (Number(request.headers.get('content-length') ?? 0) > MAX_FILE_BYTES) throw tooLarge();
  const chunks: Uint8Array[] = [];
  let bytes = 0;
  const reader = request.body?.getReader();
  for (;;) {
    const read = await reader?.read();
    if (!read || read.done) return Buffer.concat(chunks);
    bytes += read.value.byteLength;
    if (bytes > MAX_FILE_BYTES) {
      await reader?.cancel();
      throw tooLarge();
    }
    chunks.push(read.value);
  }
}
