import { readdirSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, test } from 'vitest';
import type { Handler } from '@/lib/http/handle';
import { openApi } from '@/lib/schemas/openapi';
import { describeApi } from '@/lib/schemas/openapi-document';
import { OPERATIONS } from '@/lib/schemas/operations';

const ROOT = path.join(process.cwd(), 'app/api/v1');
const VERBS = ['GET', 'POST', 'PUT', 'PATCH', 'DELETE'] as const;

/** Every verb that a route file exports, by its path in the API. */
async function exportedVerbs(): Promise<Map<string, Handler>> {
  const files = readdirSync(ROOT, { recursive: true, encoding: 'utf8' }).filter(
    (file) => path.basename(file) === 'route.ts',
  );
  const verbs = new Map<string, Handler>();
  for (const file of files) {
    const routes = (await import(/* @vite-ignore */ path.join(ROOT, file))) as Record<string, Handler>;
    const at = `/${path.dirname(file)}`.replaceAll('[', '{').replaceAll(']', '}');
    for (const verb of VERBS) if (routes[verb]) verbs.set(`${verb} ${at}`, routes[verb]);
  }
  return verbs;
}

const verbs = await exportedVerbs();
const nameOf = ({ method, path }: (typeof OPERATIONS)[number]) => `${method} ${path}`;

describe('the table of operations', () => {
  test('names every verb of every route, and nothing else', () => {
    expect([...verbs.keys()].sort()).toEqual(OPERATIONS.map(nameOf).sort());
  });

  test.each(OPERATIONS.map((operation) => [nameOf(operation), operation] as const))(
    '%s: is parsed and answered as it is described',
    (name, operation) => {
      const handler = verbs.get(name)!;
      expect(handler.open).toBe(operation.open ?? false);
      // The very same schema, so that neither can change without the other.
      expect(handler.spec.params === operation.params).toBe(true);
      expect(handler.spec.query === operation.query).toBe(true);
      expect(handler.spec.body === operation.body).toBe(true);
      if (operation.answer !== null) expect(handler.spec.status ?? 200).toBe(operation.status);
    },
  );
});

type Json = Record<string, unknown>;

/** Every object of the document, with where it stands. */
function* objectsOf(value: unknown, at = '#'): Generator<[string, Json]> {
  if (Array.isArray(value)) {
    for (const [index, each] of value.entries()) yield* objectsOf(each, `${at}/${index}`);
  } else if (typeof value === 'object' && value !== null) {
    yield [at, value as Json];
    for (const [key, each] of Object.entries(value)) yield* objectsOf(each, `${at}/${key}`);
  }
}

/** What a JSON pointer names in the document (RFC 6901). */
function follow(document: unknown, pointer: string): unknown {
  return pointer
    .slice(2)
    .split('/')
    .map((part) => part.replaceAll('~1', '/').replaceAll('~0', '~'))
    .reduce<unknown>((value, part) => (value as Json | undefined)?.[part], document);
}

describe('the OpenAPI document (OpenAPI Specification 3.1.1)', () => {
  const document = JSON.parse(JSON.stringify(describeApi('1'))) as Json;
  const operations = Object.entries(document.paths as Record<string, Record<string, Json>>).flatMap(
    ([at, item]) => Object.entries(item).map(([method, operation]) => ({ at, method, operation })),
  );

  test('has the members that 4.8.1 and 4.8.2 require', () => {
    openApi.parse(document);
    expect(document.openapi).toMatch(/^3\.1\.\d+$/);
    expect(document.info).toMatchObject({ title: 'Wakewright', version: '1' });
    expect(operations).toHaveLength(OPERATIONS.length);
  });

  test('names each operation once (4.8.10, operationId)', () => {
    const ids = operations.map(({ operation }) => operation.operationId);
    expect(new Set(ids).size).toBe(ids.length);
    expect(ids.every((id) => typeof id === 'string' && id !== '')).toBe(true);
  });

  test('describes each parameter of a path template, required, and each once (4.8.8, 4.8.12)', () => {
    for (const { at, operation } of operations) {
      const parameters = (operation.parameters ?? []) as Json[];
      const inPath = parameters.filter((each) => each.in === 'path');
      expect(inPath.map(({ name }) => name)).toEqual([...at.matchAll(/\{(\w+)\}/g)].map((match) => match[1]));
      for (const each of inPath) expect(each.required).toBe(true);
      for (const each of parameters) expect(each.schema).toBeTypeOf('object');
      const keys = parameters.map((each) => `${each.in as string} ${each.name as string}`);
      expect(new Set(keys).size).toBe(keys.length);
    }
  });

  test('answers something in every operation, each answer described (4.8.16, 4.8.17)', () => {
    for (const { operation } of operations) {
      const responses = operation.responses as Record<string, Json>;
      expect(Object.keys(responses).length).toBeGreaterThanOrEqual(2);
      for (const [status, each] of Object.entries(responses)) {
        expect(status).toMatch(/^(default|[1-5]\d\d)$/);
        expect(each.$ref ?? each.description).toBeTypeOf('string');
      }
    }
  });

  test('refers to nothing that is not there, and leaves no schema unused', () => {
    const refs = [...objectsOf(document)].flatMap(([at, { $ref }]) =>
      typeof $ref === 'string' ? [{ at, $ref }] : [],
    );
    expect(refs.length).toBeGreaterThan(100);
    for (const { at, $ref } of refs) expect(follow(document, $ref), `${at} → ${$ref}`).toBeTypeOf('object');
    const schemas = Object.keys((document.components as { schemas: Json }).schemas);
    const used = new Set(refs.map(({ $ref }) => $ref));
    expect(schemas.filter((name) => !used.has(`#/components/schemas/${name}`))).toEqual([]);
  });

  test('uses the security schemes that it defines (4.8.30)', () => {
    const defined = Object.keys((document.components as { securitySchemes: Json }).securitySchemes);
    for (const { operation } of operations)
      for (const choice of operation.security as Json[])
        for (const name of Object.keys(choice)) expect(defined).toContain(name);
  });
});
