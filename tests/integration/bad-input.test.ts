import { beforeAll, describe, expect, test } from 'vitest';
import { z } from 'zod';
import type { Role } from '@/lib/domain/access';
import { OPERATIONS } from '@/lib/schemas/operations';
import type { Operation } from '@/lib/schemas/operation';
import { recordsOf } from '../support/bad-input';
import { testDatabase } from '../support/database';
import { testApi, type Answer } from '../support/http';
import { makeWorld, type RightRequest, type World } from '../support/requests';
import { rightRequests } from '../support/right-requests';
import { spoil } from '../support/spoil';

// One world for all: since nothing that is refused changes anything, no test can spoil it for the next.
const database = testDatabase({ keep: true });
const api = testApi(database);
let world: World;
let right: Record<string, RightRequest>;

beforeAll(async () => {
  world = await makeWorld(database, api);
  right = rightRequests(world);
});

const ROLES: readonly Role[] = ['manager', 'mechanic', 'dock'];
/** Bodies of what anybody may call; nothing else about them is tried here. */
const OPEN: Record<string, Record<string, unknown>> = {
  acceptInvitation: { token: 'x'.repeat(43), name: 'Ada Reef', password: 'otters-under-the-jetty' },
  askPasswordReset: { email: 'nobody@wakewright.example' },
  resetPassword: { token: 'x'.repeat(43), password: 'otters-under-the-jetty' },
  setUp: {
    token: 'x'.repeat(43),
    operatorName: 'Tidewater Hire',
    dock: { name: 'Cais', timeZone: 'Europe/Lisbon' },
    manager: { name: 'Ines', email: 'ines@wakewright.example', password: 'otters-under-the-jetty' },
  },
};

function addressOf({ path }: Operation, { params = {}, query = {} }: Partial<RightRequest>): string {
  const filled = path.replace(/\{(\w+)\}/g, (_, name: string) => params[name] ?? '');
  const search = new URLSearchParams(query).toString();
  return search ? `${filled}?${search}` : filled;
}

type Refused = { status: number; field?: string; code?: string };

/** Expects problem+json; with the field named where one is at fault, itself, one inside it or the one it is in. */
function expectProblem(answer: Answer, { status, field, code }: Refused, why: string): void {
  const said = `${why} → ${answer.status} ${JSON.stringify(answer.body)}`;
  expect(answer.status, said).toBe(status);
  expect(answer.type, said).toBe('application/problem+json');
  expect(answer.body, said).toMatchObject({ status, type: 'about:blank', code: code ?? expect.any(String) });
  expect(answer.body.detail, said).toMatch(/\w/);
  if (field === undefined) return;
  const errors = answer.body.errors as { path: string; message: string }[];
  expect(
    errors.some(({ path }) => path === field || path.startsWith(`${field}.`)),
    said,
  ).toBe(true);
  for (const { message } of errors) expect(message, said).toMatch(/\w/);
}

async function changingNothing(run: () => Promise<void>): Promise<void> {
  const before = await recordsOf(database.db);
  await run();
  expect(await recordsOf(database.db)).toEqual(before);
}

const bodyOf = ({ id }: Operation) => OPEN[id] ?? right[id]?.body ?? {};
const permitted = ({ id }: Operation) => world.callers[right[id]?.roles[0] ?? 'manager'];
const closed = OPERATIONS.filter(({ open }) => !open).map((operation) => [operation.id, operation] as const);

test('every operation that wants signing in has a right request to be made wrong', () => {
  expect(Object.keys(right).sort()).toEqual(closed.map(([id]) => id).sort());
});

describe.each(closed)('%s', (id, operation) => {
  const send = (caller: { send: World['elsewhere']['send'] }, body: unknown = right[id]!.body) =>
    caller.send(operation.method, addressOf(operation, right[id]!), body);

  test('is refused to whoever is not signed in, has another role, or works at another dock', () =>
    changingNothing(async () => {
      expectProblem(await send(api.nobody), { status: 401, code: 'not_signed_in' }, 'nobody');
      const { roles, elsewhere } = right[id]!;
      for (const role of ROLES.filter((each) => !roles.includes(each)))
        expectProblem(await send(world.callers[role]), { status: 403, code: 'forbidden' }, role);
      if (elsewhere)
        expectProblem(await send(world.elsewhere), { status: 403, code: 'forbidden' }, 'of another dock');
    }));
});

describe.each(closed.filter(([, { params }]) => params))('%s', (id, operation) => {
  test('is refused for an id that is none, or names nothing', () =>
    changingNothing(async () => {
      const { params = {}, ...rest } = right[id]!;
      for (const field of Object.keys(params)) {
        const at = (value: string) =>
          addressOf(operation, { ...rest, params: { ...params, [field]: value } });
        const ask = (value: string) => permitted(operation).send(operation.method, at(value), rest.body);
        expectProblem(await ask('not-an-id'), { status: 422, field, code: 'invalid_input' }, 'no UUID');
        expectProblem(
          await ask('0b5d2f6e-6f0a-4c55-9a53-6d1c5c0ffee0'),
          { status: 404, field, code: 'not_found' },
          'nothing of this id',
        );
      }
    }));
});

describe.each(closed.filter(([, { query }]) => query))('%s', (id, operation) => {
  test('is refused for a query that is wrong', () =>
    changingNothing(async () => {
      const { query = {}, params } = right[id]!;
      const ask = (changed: Record<string, string>) =>
        permitted(operation).send(
          operation.method,
          addressOf(operation, { ...(params && { params }), query: { ...query, ...changed } }),
        );
      const { properties = {} } = z.toJSONSchema(operation.query!, { io: 'input' });
      expect(Object.keys(properties)).toEqual(expect.arrayContaining(Object.keys(query)));
      for (const field of Object.keys(properties))
        // A name may be anything that says something.
        for (const value of field === 'name' ? ['', 'a\nb'] : ['nonsense', '', '-1'])
          expectProblem(await ask({ [field]: value }), { status: 422, field }, `${field}=${value}`);
    }));
});

const withBody = OPERATIONS.filter(({ body }) => body).map((operation) => [operation.id, operation] as const);

describe.each(withBody)('%s', (id, operation) => {
  const send = (body: unknown, headers?: Record<string, string>) => {
    const caller = operation.open ? api.nobody : permitted(operation);
    return caller.send(operation.method, addressOf(operation, right[id] ?? {}), body, headers);
  };

  test('is refused when its body cannot be read', () =>
    changingNothing(async () => {
      const broken = { status: 400, code: 'malformed_json' };
      expectProblem(await send('{"id": '), broken, 'broken JSON');
      expectProblem(await send('\u0000'), broken, 'no text');
      expectProblem(await send('"'.padEnd(300_000, 'x')), { status: 413, code: 'too_large' }, 'oversize');
      const media = { status: 415, code: 'unsupported_media_type' };
      expectProblem(await send(bodyOf(operation), { 'content-type': 'text/plain' }), media, 'plain text');
      for (const body of ['[]', 'null', '"text"', '5'])
        expectProblem(await send(body), { status: 422, code: 'invalid_input' }, body);
    }));

  test('is refused field by field when one is missing, unknown, or of nonsense', () =>
    changingNothing(async () => {
      const spoilt = spoil(operation.body!, bodyOf(operation));
      expect(spoilt.length).toBeGreaterThan(2);
      for (const { why, field, body } of spoilt)
        expectProblem(await send(body), { status: 422, field, code: 'invalid_input' }, why);
    }));

  test('is refused for ids in its body that name nothing', () =>
    changingNothing(async () => {
      const body = bodyOf(operation);
      for (const field of Object.keys(body).filter((name) => /^(unit|model|dock|rule)Id$/.test(name)))
        expectProblem(
          await send({ ...body, [field]: '0b5d2f6e-6f0a-4c55-9a53-6d1c5c0ffee0' }),
          { status: 404, field, code: 'not_found' },
          `${field} of nothing`,
        );
    }));
});
