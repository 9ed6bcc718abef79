import { expect, test } from 'vitest';
import { OPERATIONS } from '@/lib/schemas/operations';
import { openApi } from '@/lib/schemas/openapi';
import { testDatabase } from '../support/database';
import { testApi } from '../support/http';
import { makeWorld } from '../support/requests';
import { rightRequests } from '../support/right-requests';

const database = testDatabase();
const api = testApi(database);

/** Carried out after the others, in this order: what they take away is still wanted before. */
const LAST = [
  'endRule',
  'reopenRule',
  'withdrawInvitation',
  'deactivatePerson',
  'reactivatePerson',
  'revokeApiKey',
  'endOwnSessions',
];
/** What a right request alone cannot do: a password that was never set is not changed, a file is no JSON. */
const ELSEWHERE = [
  'changePassword',
  'addAttachment',
  'readAttachment',
  'readAttachmentThumb',
  'removeAttachment',
  'restoreAttachment',
];

const ordered = [
  ...OPERATIONS.filter(({ id }) => !LAST.includes(id)),
  ...LAST.map((id) => OPERATIONS.find((operation) => operation.id === id)!),
].filter(({ open, id }) => !open && !ELSEWHERE.includes(id));

test('every right request is answered with the status and the shape that the API describes', async () => {
  const world = await makeWorld(database, api);
  const right = rightRequests(world);
  for (const { id, method, path, status, answer } of ordered) {
    const { params = {}, query = {}, body } = right[id]!;
    const at = path.replace(/\{(\w+)\}/g, (_, name: string) => params[name] ?? '');
    const search = new URLSearchParams(query).toString();
    const got = await world.callers.manager.send<unknown>(method, search ? `${at}?${search}` : at, body);
    const said = `${id} → ${got.status} ${JSON.stringify(got.body)}`;
    expect(got.status, said).toBe(status);
    if (answer === null) expect(got.body, said).toBeNull();
    // Parsed, it has lost every field that the schema does not name: an answer must have had none.
    else if (typeof answer !== 'string') expect(answer.parse(got.body), said).toEqual(got.body);
  }
});

test('the description of the API is there for anybody', async () => {
  const { status, body } = await api.nobody.send('GET', '/openapi.json');
  expect(status).toBe(200);
  expect(Object.keys(openApi.parse(body).paths)).toContain('/api/v1/units/{id}/history');
});
