import { clearDefect } from '@/lib/actions/clear-defect';
import { handle } from '@/lib/http/handle';
import { idParams } from '@/lib/schemas/common';
import { clearDefect as clearDefectInput } from '@/lib/schemas/defect';

export const POST = handle(
  { params: idParams, body: clearDefectInput, status: 201 },
  (ctx, { params, body }) => clearDefect(ctx, params.id, body),
);
