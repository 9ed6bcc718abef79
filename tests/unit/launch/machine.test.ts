import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { createServer } from 'node:net';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { buildCurrent, noteBuild, sourcesHash } from '@/lib/launch/build';
import { withLock } from '@/lib/launch/lock';
import { freePort } from '@/lib/launch/ports';
import { startTicks } from '@/lib/launch/processes';
import { claimCheckout, releaseCheckout } from '@/lib/launch/running';
import { keptValue } from '@/lib/launch/state-folder';
import { welcomeLines } from '@/lib/launch/welcome';

let root: string;
beforeEach(() => {
  root = mkdtempSync(path.join(tmpdir(), 'checkout-'));
});
afterEach(() => rmSync(root, { recursive: true }));

describe('a build', () => {
  const write = (file: string, text: string) => {
    mkdirSync(path.dirname(path.join(root, file)), { recursive: true });
    writeFileSync(path.join(root, file), text);
  };

  test('is current until a source changes, moves or appears', () => {
    write('app/page.tsx', 'one');
    write('.next/BUILD_ID', 'id');
    expect(buildCurrent(root)).toBe(false);
    noteBuild(root, sourcesHash(root));
    expect(buildCurrent(root)).toBe(true);
    write('tests/unit/x.test.ts', 'tests are no source of the build');
    expect(buildCurrent(root)).toBe(true);
    write('app/page.tsx', 'two');
    expect(buildCurrent(root)).toBe(false);
    write('app/page.tsx', 'one');
    write('lib/domain/due.ts', '');
    expect(buildCurrent(root)).toBe(false);
  });
});

describe('a port', () => {
  test('that is taken is replaced by a free one', async () => {
    const taken = createServer();
    await new Promise<void>((resolve) => taken.listen(0, '127.0.0.1', resolve));
    const address = taken.address();
    const port = typeof address === 'object' && address ? address.port : 0;
    const found = await freePort(port);
    expect(found).not.toBe(port);
    expect(found).toBeGreaterThan(0);
    await new Promise((resolve) => taken.close(resolve));
    expect(await freePort(port)).toBe(port);
  });
});

describe('a checkout', () => {
  test('is run by one launcher at a time, and by the next after a crash', async () => {
    await claimCheckout(root);
    const other = { name: 'launcher', pid: process.ppid, ticks: startTicks(process.ppid) };
    writeFileSync(path.join(root, '.wakewright/running.json'), JSON.stringify([other]));
    await expect(claimCheckout(root)).rejects.toThrow(
      `already running from this folder (process ${process.ppid})`,
    );
    writeFileSync(path.join(root, '.wakewright/running.json'), JSON.stringify([{ ...other, ticks: '1' }]));
    await claimCheckout(root);
    releaseCheckout(root);
  });

  test('keeps its secret', () => {
    expect(keptValue(root, 'secret', () => 'first')).toBe('first');
    expect(keptValue(root, 'secret', () => 'second')).toBe('first');
  });

  test('does one thing at a time under a lock, and a crashed holder’s lock is free', async () => {
    const file = path.join(root, 'build.lock');
    writeFileSync(file, '1 0');
    const order: string[] = [];
    await Promise.all(
      ['a', 'b'].map((name) =>
        withLock(file, async () => {
          order.push(`${name} in`);
          await Promise.resolve();
          order.push(`${name} out`);
        }),
      ),
    );
    expect([order.slice(0, 2), order.slice(2)].map(([first, second]) => [first?.[0], second?.[0]])).toEqual([
      [order[0]?.[0], order[0]?.[0]],
      [order[2]?.[0], order[2]?.[0]],
    ]);
    expect(new Set(order).size).toBe(4);
  });
});

describe('the welcome', () => {
  const PUBLIC_URL = 'http://127.0.0.1:3000';

  test('names the addresses and the demo’s people', () => {
    const text = welcomeLines({
      env: { PUBLIC_URL },
      embedded: true,
      mailboxUrl: 'http://127.0.0.1:8025',
    }).join('\n');
    for (const role of ['manager', 'mechanic', 'dock']) expect(text).toContain(`${role}@wakewright.example`);
    expect(text).toContain('three-docks-afloat');
    expect(text).toContain('http://127.0.0.1:8025');
  });

  test('offers no demo on a database of one’s own, but the token when it is empty', () => {
    const text = welcomeLines({ env: { PUBLIC_URL, SETUP_TOKEN: 'the-token' }, embedded: false }).join('\n');
    expect(text).not.toContain('wakewright.example');
    expect(text).toContain('the-token');
  });
});
