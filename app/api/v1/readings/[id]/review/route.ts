import { reviewReading } from '@/lib/actions/review-reading';
import { handle } from '@/lib/http/handle';
import { idParams } from '@/lib/schemas/common';
import { reviewReading as reviewReadingInput } from '@/lib/schemas/reading';

export const POST = handle(
  { params: idParams, body: reviewReadingInput, status: 201 },
  (ctx, { params, body }) => reviewReading(ctx, params.id, body),
);
