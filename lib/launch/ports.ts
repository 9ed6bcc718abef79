import { type AddressInfo, createServer } from 'node:net';

function listen(port: number, host: string): Promise<number | undefined> {
  return new Promise((resolve) => {
    const probe = createServer();
    probe.once('error', () => resolve(undefined));
    probe.listen({ port, host, exclusive: true }, () => {
      const { port: found } = probe.address() as AddressInfo;
      probe.close(() => resolve(found));
    });
  });
}

/** `preferred` when it is free on `host`, otherwise one of the next twenty, otherwise any. */
export async function freePort(preferred?: number, host = '127.0.0.1'): Promise<number> {
  const wanted = preferred ? Array.from({ length: 21 }, (_, index) => preferred + index) : [];
  for (const port of [...wanted.filter((number) => number <= 65535), 0]) {
    const found = await listen(port, host);
    if (found) return found;
  }
  throw new Error(`no free port on ${host}`);
}
