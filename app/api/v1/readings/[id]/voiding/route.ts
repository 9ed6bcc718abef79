import { voidReading } from '@/lib/actions/void-reading';
import { handle } from '@/lib/http/handle';
import { idParams } from '@/lib/schemas/common';
import { voidReading as voidReadingInput } from '@/lib/schemas/reading';

export const POST = handle(
  { params: idParams, body: voidReadingInput, status: 201 },
  (ctx, { params, body }) => voidReading(ctx, params.id, body),
);
