import { readAttachment } from '@/lib/actions/read-attachment';
import { removeAttachment } from '@/lib/actions/remove-attachment';
import { fileResponse } from '@/lib/http/file-response';
import { handle } from '@/lib/http/handle';
import { idParams } from '@/lib/schemas/common';
import { objectStore } from '@/lib/storage/object-store';

export const GET = handle({ params: idParams }, async (ctx, { params }) =>
  fileResponse(await readAttachment(ctx, params.id, { store: objectStore, small: false })),
);

export const DELETE = handle({ params: idParams }, (ctx, { params }) => removeAttachment(ctx, params.id));
