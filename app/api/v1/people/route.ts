import { createPerson } from '@/lib/actions/create-person';
import { listPeople } from '@/lib/actions/list-people';
import { handle } from '@/lib/http/handle';
import { createPerson as createPersonInput } from '@/lib/schemas/person';

export const GET = handle({}, async (ctx) => ({ items: await listPeople(ctx), nextCursor: null }));

export const POST = handle({ body: createPersonInput, status: 201 }, (ctx, { body }) =>
  createPerson(ctx, body),
);
