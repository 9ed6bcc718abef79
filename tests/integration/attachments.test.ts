import { randomUUID } from 'node:crypto';
import { mkdtempSync } from 'node:fs';
import { rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { crc32, deflateSync } from 'node:zlib';
import sharp from 'sharp';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { sweepFiles } from '@/lib/actions/sweep-files';
import type { Attachment } from '@/lib/schemas/attachment';
import { objectStore } from '@/lib/storage/object-store';
import { startObjectStore, type ObjectStore } from '../fakes/object-store';
import { asSystem, openDock } from '../support/crew';
import { testDatabase } from '../support/database';
import { testApi, type Caller } from '../support/http';

const directory = mkdtempSync(path.join(tmpdir(), 'wakewright-files-'));
let store: ObjectStore;
const database = testDatabase();
beforeAll(async () => {
  store = await startObjectStore({ directory });
});
const api = testApi(database, { filesUrl: () => store.url });
afterAll(async () => {
  await store.stop();
  await rm(directory, { recursive: true });
});

let home: Awaited<ReturnType<typeof openDock>>;
let hand: Caller;
let mechanic: Caller;
let elsewhere: Caller;

beforeEach(async () => {
  home = await openDock(database.db, {});
  const far = await openDock(database.db, { name: 'Cais Sul', fleetNumber: 'S-1' });
  hand = await api.caller('dock');
  mechanic = await api.caller('mechanic');
  elsewhere = await api.caller('manager', { dockIds: [far.dock.id] });
});

/** Two halves, red above green, 40 by 60 pixels: one sees which way it lies. */
const picture = () =>
  sharp({ create: { width: 40, height: 60, channels: 3, background: '#00ff00' } }).composite([
    { input: { create: { width: 40, height: 30, channels: 3, background: '#ff0000' } }, top: 0, left: 0 },
  ]);

type Sent = {
  status: number;
  body: Attachment & { code: string; errors: { path: string; message: string }[] };
};
async function add(file: Buffer | string, more: Record<string, string> = {}, by = hand): Promise<Sent> {
  const query = new URLSearchParams({ id: randomUUID(), unitId: home.unit.id, name: 'hatch.jpg', ...more });
  const response = await api.post(`/attachments?${query}`, by, file);
  return { status: response.status, body: (await response.json()) as Sent['body'] };
}
const read = async (id: string, by = hand, small = '') => api.get(`/attachments/${id}${small}`, by);

describe('a picture', () => {
  test('is kept as an upright JPEG with a small one of it, and served to those who may see the unit', async () => {
    const { status, body } = await add(await picture().png().toBuffer());
    expect(status).toBe(201);
    expect(body).toMatchObject({ kind: 'picture', name: 'hatch.jpg', width: 40, height: 60 });
    const full = await read(body.id, mechanic);
    expect(full.headers.get('content-type')).toBe('image/jpeg');
    expect(full.headers.get('x-content-type-options')).toBe('nosniff');
    expect(full.headers.get('content-security-policy')).toContain('sandbox');
    expect((await sharp(Buffer.from(await full.arrayBuffer())).metadata()).format).toBe('jpeg');
    expect((await read(body.id, hand, '/thumb')).status).toBe(200);
    expect((await read(body.id, elsewhere)).status).toBe(403);
    expect((await read(body.id, elsewhere, '/thumb')).status).toBe(403);
  });

  // EXIF 2.32, tag 0x0112: 6 and 8 lie on their sides, 3 stands on its head, 2, 4, 5 and 7 are mirrored.
  test.each([1, 2, 3, 4, 5, 6, 7, 8])('taken with orientation %i is turned upright', async (orientation) => {
    const file = await turned(orientation);
    const { body } = await add(file);
    expect([body.width, body.height]).toEqual([40, 60]);
    const kept = Buffer.from(await (await read(body.id)).arrayBuffer());
    const { data } = await sharp(kept).raw().toBuffer({ resolveWithObject: true });
    const at = (x: number, y: number) => [...data.subarray((y * 40 + x) * 3, (y * 40 + x) * 3 + 3)];
    const [red = 0, green = 0] = at(20, 5);
    const [lowRed = 0, lowGreen = 0] = at(20, 55);
    expect(red).toBeGreaterThan(green);
    expect(lowGreen).toBeGreaterThan(lowRed);
    expect((await sharp(kept).metadata()).orientation).toBeUndefined();
  });

  test('goes on without the place it was taken at', async () => {
    const file = await picture()
      .withExif({ IFD0: { Make: 'Pinhole' }, IFD3: { GPSLatitudeRef: 'N', GPSLatitude: '38/1 41/1 0/1' } })
      .jpeg()
      .toBuffer();
    expect((await sharp(file).metadata()).exif).toBeDefined();
    const { body } = await add(file);
    const kept = Buffer.from(await (await read(body.id)).arrayBuffer());
    expect((await sharp(kept).metadata()).exif).toBeUndefined();
    expect(kept.includes('Pinhole')).toBe(false);
  });

  test('of a large camera is kept no larger than a screen needs', async () => {
    const file = await sharp({ create: { width: 5200, height: 2600, channels: 3, background: '#123456' } })
      .jpeg()
      .toBuffer();
    expect((await add(file)).body).toMatchObject({ width: 2560, height: 1280 });
  });

  test('sent again under its id is kept once', async () => {
    const file = await picture().jpeg().toBuffer();
    const id = randomUUID();
    expect((await add(file, { id })).status).toBe(201);
    expect((await add(file, { id })).body.id).toBe(id);
    const { body } = await mechanic.send<{ items: Attachment[] }>(
      'GET',
      `/attachments?unitId=${home.unit.id}`,
    );
    expect(body.items).toHaveLength(1);
    expect((await store.keys()).length).toBeGreaterThanOrEqual(2);
  });
});

/** A PNG of a few bytes that says it has 30,000 by 30,000 pixels (PNG, third edition: signature, IHDR, IDAT, IEND). */
function hugePng(): Buffer {
  const chunk = (type: string, data: Buffer) => {
    const named = Buffer.concat([Buffer.from(type), data]);
    const [length, check] = [Buffer.alloc(4), Buffer.alloc(4)];
    length.writeUInt32BE(data.length);
    check.writeUInt32BE(crc32(named));
    return Buffer.concat([length, named, check]);
  };
  const header = Buffer.alloc(13);
  header.writeUInt32BE(30_000, 0);
  header.writeUInt32BE(30_000, 4);
  header.set([1, 0, 0, 0, 0], 8);
  return Buffer.concat([
    Buffer.from('89504e470d0a1a0a', 'hex'),
    chunk('IHDR', header),
    chunk('IDAT', deflateSync(Buffer.alloc(3751 * 64))),
    chunk('IEND', Buffer.alloc(0)),
  ]);
}

/** The picture as a camera held that way would write it. */
async function turned(orientation: number): Promise<Buffer> {
  const upright = await picture().png().toBuffer();
  const flat = {
    1: sharp(upright),
    2: sharp(upright).flop(),
    3: sharp(upright).rotate(180),
    4: sharp(upright).flip(),
    5: sharp(await sharp(upright).rotate(270).toBuffer()).flip(),
    6: sharp(upright).rotate(270),
    7: sharp(await sharp(upright).rotate(90).toBuffer()).flip(),
    8: sharp(upright).rotate(90),
  }[orientation]!;
  return sharp(await flat.png().toBuffer())
    .withMetadata({ orientation })
    .jpeg({ quality: 100 })
    .toBuffer();
}

describe('what is no picture and no document', () => {
  const svg = '<svg xmlns="http://www.w3.org/2000/svg"><script>alert(1)</script></svg>';
  const html = '<!doctype html><script>alert(1)</script>';
  const head = (file: Buffer) => file.subarray(0, Math.floor(file.length / 2));
  test.each<[string, () => Promise<Buffer | string> | string | Buffer]>([
    ['an SVG with a script', () => svg],
    ['a page that is called .jpg', () => html],
    ['nothing at all', () => Buffer.alloc(0)],
    [
      'half a picture',
      async () =>
        head(
          await sharp({ create: { width: 900, height: 900, channels: 3, background: '#0a0' } })
            .jpeg()
            .toBuffer(),
        ),
    ],
    ['a program', () => Buffer.from([0x7f, 0x45, 0x4c, 0x46, 2, 1, 1, 0, ...new Array<number>(80).fill(0)])],
    ['an archive', () => Buffer.from('504b0304140000000000', 'hex')],
    ['a small file that unpacks to a huge picture', () => hugePng()],
  ])('%s is refused, and nothing is stored', async (_, make) => {
    const before = await store.keys();
    const { status, body } = await add(await make());
    expect([status, body.errors[0]?.path]).toEqual([422, 'file']);
    expect(await store.keys()).toEqual(before);
  });

  test('a file above the largest size is refused before it is looked into', async () => {
    const { status, body } = await add(Buffer.alloc(15 * 1024 * 1024 + 1));
    expect([status, body.code, body.errors[0]?.path]).toEqual([413, 'too_large', 'file']);
  });

  test('a picture with a page behind its end is kept without the page', async () => {
    const file = Buffer.concat([await picture().jpeg().toBuffer(), Buffer.from(html)]);
    const { body } = await add(file);
    expect(Buffer.from(await (await read(body.id)).arrayBuffer()).includes('script')).toBe(false);
  });

  test('a name with a path in it stays a name', async () => {
    const { body } = await add(await picture().jpeg().toBuffer(), { name: '../../etc/passwd.jpg' });
    expect(body.name).toBe('../../etc/passwd.jpg');
    const header = (await read(body.id)).headers.get('content-disposition');
    expect(header).toBe("inline; filename*=UTF-8''..%2F..%2Fetc%2Fpasswd.jpg");
    expect((await store.keys()).every((key) => /^attachments\/[0-9a-f]{32}$/.test(key))).toBe(true);
  });
});

test('a PDF is kept as it is and only ever downloaded', async () => {
  const pdf = Buffer.from('%PDF-1.4\n1 0 obj<</OpenAction<</S/JavaScript/JS(app.alert(1))>>>>endobj\n%%EOF');
  const { status, body } = await add(pdf, { name: 'manual.pdf' });
  expect([status, body.kind]).toEqual([201, 'document']);
  const got = await read(body.id);
  expect(got.headers.get('content-disposition')).toMatch(/^attachment/);
  expect(got.headers.get('content-security-policy')).toContain('sandbox');
  expect(Buffer.from(await got.arrayBuffer()).equals(pdf)).toBe(true);
  expect((await read(body.id, hand, '/thumb')).status).toBe(404);
});

test('a task or a defect of another unit is refused', async () => {
  const other = await openDock(database.db, { name: 'Cais Este', fleetNumber: 'E-1' });
  const { body: defect } = await mechanic.send<{ id: string }>('POST', '/defects', {
    unitId: other.unit.id,
    title: 'Cracked hatch',
    holdsUnit: false,
  });
  const file = await picture().jpeg().toBuffer();
  const { status, body } = await add(file, { defectId: defect.id });
  expect([status, body.errors[0]?.path]).toEqual([422, 'defectId']);
  expect((await add(file, {}, elsewhere)).status).toBe(403);
});

describe('removing', () => {
  const remove = (id: string, by: Caller) => by.send<Attachment>('DELETE', `/attachments/${id}`);

  test('is for whoever added it and the workshop, and can be undone', async () => {
    const { body } = await add(await picture().jpeg().toBuffer());
    expect((await remove(body.id, await api.caller('dock'))).status).toBe(403);
    expect((await remove(body.id, hand)).body.removedAt).not.toBeNull();
    expect((await read(body.id)).status).toBe(404);
    expect((await mechanic.send('POST', `/attachments/${body.id}/restoration`)).status).toBe(200);
    expect((await read(body.id)).status).toBe(200);
  });

  test('the sweep deletes what was removed a week ago and what no record points to, and nothing else', async () => {
    const kept = (await add(await picture().jpeg().toBuffer())).body;
    const gone = (await add(await picture().jpeg().toBuffer())).body;
    await remove(gone.id, hand);
    await objectStore.put('0123456789abcdef0123456789abcdef', Buffer.from('orphan'), 'image/jpeg');
    const before = await store.keys();
    const soon = asSystem(database.db, new Date());
    expect(await sweepFiles(soon, objectStore)).toEqual({ deleted: 0 });
    expect(await store.keys()).toEqual(before);
    const later = asSystem(database.db, new Date(Date.now() + 8 * 24 * 3_600_000));
    await sweepFiles(later, objectStore);
    expect(await sweepFiles(later, objectStore)).toEqual({ deleted: 0 });
    const rows = await database.db.selectFrom('attachment').select(['object_key', 'thumb_key']).execute();
    const pointed = rows.flatMap((row) => [`attachments/${row.object_key}`, `attachments/${row.thumb_key}`]);
    expect(await store.keys()).toEqual(pointed.sort());
    expect((await read(kept.id)).status).toBe(200);
  });
});
