import { createDock } from '@/lib/actions/create-dock';
import { listDocks } from '@/lib/actions/list-docks';
import { handle } from '@/lib/http/handle';
import { createDock as createDockInput } from '@/lib/schemas/dock';

export const GET = handle({}, async (ctx) => ({ items: await listDocks(ctx), nextCursor: null }));

export const POST = handle({ body: createDockInput, status: 201 }, (ctx, { body }) => createDock(ctx, body));
