import { openFollowUp } from '@/lib/actions/open-follow-up';
import { handle } from '@/lib/http/handle';
import { idParams } from '@/lib/schemas/common';
import { openFollowUp as openFollowUpInput } from '@/lib/schemas/work';

export const POST = handle(
  { params: idParams, body: openFollowUpInput, status: 201 },
  (ctx, { params, body }) => openFollowUp(ctx, params.id, body),
);
