import { z } from 'zod';

/** One thing made wrong in a body that was right, and the field that a refusal must name. */
export type Spoilt = { why: string; field: string; body: unknown };

type Shape = {
  type?: string;
  format?: string;
  enum?: unknown[];
  const?: unknown;
  anyOf?: Shape[];
  properties?: Record<string, Shape>;
  required?: string[];
  additionalProperties?: unknown;
  items?: Shape;
  minimum?: number;
  maximum?: number;
  maxLength?: number;
};
type Fields = Record<string, unknown>;

const NONSENSE = { nonsense: true };

/** Values that no field of this shape may have, each with what is wrong with it. */
function wrongValues(shape: Shape): [why: string, value: unknown][] {
  const choices = shape.anyOf?.filter(({ type }) => type !== 'null') ?? [];
  if (choices.length === 1) return wrongValues(choices[0]!);
  if (choices.length > 1) return [['of a wrong type', 12]];
  if (shape.enum || shape.const !== undefined)
    return [
      ['none of the choices', 'nonsense'],
      ['an object', NONSENSE],
    ];
  switch (shape.type) {
    case 'string':
      return [['a number', 5], ['an object', NONSENSE], ...wrongTexts(shape)];
    case 'number':
    case 'integer':
      return [
        ['text', 'twelve'],
        ['digits as text', '12'],
        ['an object', NONSENSE],
        ...((shape.maximum ?? 1e16) < 1e15 ? [['absurdly large', 1e15] satisfies [string, unknown]] : []),
        ...((shape.minimum ?? -1) >= 0 ? [['negative', -1] satisfies [string, unknown]] : []),
        ...(shape.type === 'integer' ? [['a fraction', 1.5] satisfies [string, unknown]] : []),
      ];
    case 'boolean':
      return [
        ['text', 'true'],
        ['a number', 1],
      ];
    case 'array':
      return [
        ['text', 'x'],
        ['an object', NONSENSE],
        ['a list of what it must not hold', [NONSENSE]],
      ];
    case 'object':
      return [
        ['text', 'x'],
        ['a list', []],
      ];
    default:
      return [];
  }
}

function wrongTexts({ format, maxLength }: Shape): [string, unknown][] {
  if (format === 'uuid') return [['no UUID', 'not-an-id']];
  if (format === 'date')
    return [
      ['a day that does not exist', '2026-02-30'],
      ['no day', 'soon'],
    ];
  if (format === 'date-time')
    return [
      ['an instant that does not exist', '2026-02-30T10:00:00Z'],
      ['no instant', 'soon'],
    ];
  return maxLength ? [['too long', 'x'.repeat(maxLength + 1)]] : [];
}

/** The parts of a right body that are wrong one at a time, after the schema the route parses with. */
export function spoil(schema: z.ZodType, right: Fields): Spoilt[] {
  const shape = z.toJSONSchema(schema, { io: 'input', unrepresentable: 'any', override: nameDays }) as Shape;
  return spoilObject(shape, right, '', (body) => body);
}

/** Days are texts to the schema; they are known by the sentence that refuses one. */
function nameDays({
  zodSchema,
  jsonSchema,
}: {
  zodSchema: unknown;
  jsonSchema: { type?: unknown; format?: unknown };
}) {
  if (jsonSchema.type !== 'string') return;
  const issue = (zodSchema as z.ZodType).safeParse('soon').error?.issues[0]?.message ?? '';
  if (issue.includes('YYYY-MM-DD')) jsonSchema.format = 'date';
}

function spoilObject(shape: Shape, right: Fields, at: string, wrap: (body: Fields) => unknown): Spoilt[] {
  const path = (name: string) => (at ? `${at}.${name}` : name);
  const spoilt: Spoilt[] = [];
  if (shape.additionalProperties === false)
    spoilt.push({
      why: 'a field that is none',
      field: path('nonsense'),
      body: wrap({ ...right, nonsense: 1 }),
    });
  for (const [name, each] of Object.entries(shape.properties ?? {})) {
    const field = path(name);
    if (shape.required?.includes(name)) {
      const { [name]: _, ...rest } = right;
      spoilt.push({ why: `${field} missing`, field, body: wrap(rest) });
      if (!each.anyOf?.some(({ type }) => type === 'null'))
        spoilt.push({ why: `${field} null`, field, body: wrap({ ...right, [name]: null }) });
    }
    for (const [why, value] of wrongValues(each))
      spoilt.push({ why: `${field}: ${why}`, field, body: wrap({ ...right, [name]: value }) });
    const inside = right[name];
    if (each.type === 'object' && each.properties && typeof inside === 'object')
      spoilt.push(
        ...spoilObject(each, inside as Fields, field, (value) => wrap({ ...right, [name]: value })),
      );
  }
  return spoilt;
}
