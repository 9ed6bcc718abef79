import { sql, type Kysely } from 'kysely';
import { expect } from 'vitest';
import type { DB } from '@/db/tables';
import type { Caller } from './http';

/** Written at sign-in and at every request, whatever it asks. */
const BOOKKEEPING = ['session', 'api_key', 'sign_in_attempt', 'known_device', 'worker_heartbeat'];

/**
 * Every table of ours and of the job queue, with how many rows it has and a digest of which transaction wrote each:
 * equal before and after means that nothing was written, not even the same value again.
 */
export async function recordsOf(db: Kysely<DB>): Promise<Record<string, string>> {
  const tables = await sql<{ schema: string; name: string }>`
    select schemaname as schema, tablename as name from pg_tables
     where schemaname in ('public', 'graphile_worker') order by 1, 2`.execute(db);
  const records: Record<string, string> = {};
  for (const { schema, name } of tables.rows) {
    if (BOOKKEEPING.includes(name)) continue;
    const { rows } = await sql<{ state: string }>`
      select count(*) || ' rows, ' || coalesce(md5(string_agg(xmin::text || ctid::text, ' ' order by ctid)), '-') as state
        from ${sql.table(`${schema}.${name}`)}`.execute(db);
    records[`${schema}.${name}`] = rows[0]!.state;
  }
  return records;
}

/** A request that must be refused: the status, and the field that the refusal names. */
export type Bad = {
  method: string;
  path: string;
  body?: unknown;
  status: number;
  field?: string;
  code?: string;
};

/** Sends it, and expects problem+json with the field named and nothing written anywhere. */
export async function expectRefused(db: Kysely<DB>, caller: Caller, bad: Bad): Promise<void> {
  const before = await recordsOf(db);
  const { status, body } = await caller.send(bad.method, bad.path, bad.body);
  const said = JSON.stringify(body);
  expect(status, said).toBe(bad.status);
  expect(body, said).toMatchObject({
    status,
    title: expect.any(String) as string,
    detail: expect.any(String) as string,
  });
  if (bad.code) expect(body.code, said).toBe(bad.code);
  if (bad.field !== undefined) {
    const errors = body.errors as { path: string; message: string }[];
    expect(
      errors.map(({ path }) => path),
      said,
    ).toContain(bad.field);
    for (const { message } of errors) expect(message).toMatch(/\w/);
  }
  expect(await recordsOf(db)).toEqual(before);
}

/** Bodies that no route can read: broken JSON, no JSON, a list, and more than a body may be. */
export function unreadable(method: string, path: string): Bad[] {
  return [
    { method, path, body: '{"id": ', status: 400, code: 'malformed_json' },
    { method, path, body: 'not JSON', status: 400, code: 'malformed_json' },
    { method, path, body: '[]', status: 422, field: '' },
    { method, path, body: 'null', status: 422, field: '' },
    { method, path, body: JSON.stringify({ note: 'x'.repeat(300_000) }), status: 413, code: 'too_large' },
  ];
}
