import { recordEntry } from '@/lib/actions/record-entry';
import { handle } from '@/lib/http/handle';
import { idParams } from '@/lib/schemas/common';
import { recordEntry as recordEntryInput } from '@/lib/schemas/work';

export const POST = handle(
  { params: idParams, body: recordEntryInput, status: 201 },
  (ctx, { params, body }) => recordEntry(ctx, params.id, body),
);
