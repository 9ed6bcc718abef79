import { z } from 'zod';
import { account } from './account';
import { apiKey } from './api-key';
import { hold } from './availability';
import { baseline } from './baseline';
import { checkIn } from './check-in';
import { checkOut } from './check-out';
import { day } from './common';
import { defect } from './defect';
import { dock } from './dock';
import { unitDuty } from './due-point';
import { historyEntry } from './history';
import { invitation } from './invitation';
import { layUp } from './lay-up';
import { model } from './model';
import type { OpenApi } from './openapi';
import type { Operation } from './operation';
import { OPERATIONS } from './operations';
import { person } from './person';
import { problem } from './problem';
import { reading } from './reading';
import { listedRule, rule } from './rule';
import { closure, task, taskPage } from './task';
import { unit } from './unit';

/** What is answered in several places, described once under its name. */
const NAMED = {
  Account: account,
  ApiKey: apiKey,
  Baseline: baseline,
  CheckIn: checkIn,
  CheckOut: checkOut,
  Closure: closure,
  Defect: defect,
  Dock: dock,
  Duty: unitDuty,
  HistoryEntry: historyEntry,
  Hold: hold,
  Invitation: invitation,
  LayUp: layUp,
  ListedRule: listedRule,
  Model: model,
  Person: person,
  Problem: problem,
  Reading: reading,
  Rule: rule,
  Task: task,
  TaskPage: taskPage,
  Unit: unit,
};

type Json = Record<string, unknown>;
type Io = 'input' | 'output';

const metadata = z.registry<z.core.JSONSchemaMeta>();
metadata.add(day, { format: 'date' });
for (const [id, schema] of Object.entries(NAMED)) metadata.add(schema, { id });

/** The API's description, OpenAPI 3.1, made from the schemas that the routes parse with. */
export function describeApi(version: string): OpenApi {
  const schemas: Json = {};
  const describe = (schema: z.ZodType, io: Io) => describeSchema(schema, io, schemas);
  const paths: Record<string, Json> = {};
  for (const operation of OPERATIONS) {
    const path = (paths[`/api/v1${operation.path}`] ??= {});
    path[operation.method.toLowerCase()] = describeOperation(operation, describe);
  }
  describe(problem, 'output');
  return {
    openapi: '3.1.1',
    info: {
      title: 'Wakewright',
      version,
      description:
        'Engine hours in decimal hours with one place, days as YYYY-MM-DD in the dock’s time zone, instants as ' +
        'RFC 3339. Lists answer `items` and `nextCursor`. What is refused is problem+json with a `code` and the ' +
        'fields it concerns.',
    },
    paths,
    components: {
      schemas,
      securitySchemes: {
        apiKey: { type: 'http', scheme: 'bearer', description: 'An API key of one’s own.' },
        session: {
          type: 'apiKey',
          in: 'cookie',
          name: 'next-auth.session-token',
          description: 'With `__Secure-` in front over https, and `<port>.` where the address names a port.',
        },
      },
      responses: {
        Problem: {
          description: 'Refused, or a fault',
          content: { 'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } } },
        },
      },
    },
  };
}

type Describe = (schema: z.ZodType, io: Io) => Json;

function describeOperation(operation: Operation, describe: Describe): Json {
  const { id, tag, summary, open, params, query, body, takesFile, status } = operation;
  const parameters = [
    ...(params ? describeParameters('path', describe(params, 'input')) : []),
    ...(query ? describeParameters('query', describe(query, 'input')) : []),
  ];
  return {
    operationId: id,
    tags: [tag],
    summary,
    security: open ? [] : [{ apiKey: [] }, { session: [] }],
    ...(parameters.length > 0 && { parameters }),
    ...(body && {
      requestBody: { required: true, content: { 'application/json': { schema: describe(body, 'input') } } },
    }),
    ...(takesFile && {
      requestBody: { required: true, content: { 'application/octet-stream': {} } },
    }),
    responses: {
      [status]: describeAnswer(operation, describe),
      default: { $ref: '#/components/responses/Problem' },
    },
  };
}

function describeAnswer({ answer, summary }: Operation, describe: Describe): Json {
  if (answer === null) return { description: 'Done' };
  if (answer === 'file')
    return { description: summary, content: { 'image/jpeg': {}, 'application/pdf': {} } };
  if (answer === 'pdf') return { description: summary, content: { 'application/pdf': {} } };
  if (answer === 'html') return { description: summary, content: { 'text/html': {} } };
  return { description: summary, content: { 'application/json': { schema: describe(answer, 'output') } } };
}

function describeParameters(place: 'path' | 'query', schema: Json): Json[] {
  const properties = (schema.properties ?? {}) as Record<string, Json>;
  const required = (schema.required ?? []) as string[];
  return Object.entries(properties).map(([name, each]) => ({
    name,
    in: place,
    required: place === 'path' || required.includes(name),
    schema: each,
  }));
}

/** The JSON Schema of a zod schema; what it refers to by name goes to `shared`. */
function describeSchema(schema: z.ZodType, io: Io, shared: Json): Json {
  const made = z.toJSONSchema(schema, { io, metadata, unrepresentable: 'any', cycles: 'ref' });
  const { $schema: _, $defs = {}, ...rest } = referring(made) as Json & { $defs?: Json };
  for (const [name, each] of Object.entries($defs)) shared[name] = each;
  const { id, ...own } = rest;
  if (typeof id !== 'string') return rest;
  shared[id] = own;
  return { $ref: `#/components/schemas/${id}` };
}

/** As it is, with references to the document's components instead of the schema's own definitions. */
function referring(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(referring);
  if (typeof value !== 'object' || value === null) return value;
  return Object.fromEntries(
    Object.entries(value).map(([key, each]) => [
      key,
      key === '$ref' && typeof each === 'string'
        ? each.replace('#/$defs/', '#/components/schemas/')
        : referring(each),
    ]),
  );
}
