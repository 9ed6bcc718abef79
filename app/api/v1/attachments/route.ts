import { addAttachment } from '@/lib/actions/add-attachment';
import { listAttachments } from '@/lib/actions/list-attachments';
import { handle } from '@/lib/http/handle';
import { readBytes, takingTurns } from '@/lib/http/read-bytes';
import { addAttachment as addAttachmentInput, attachmentsQuery } from '@/lib/schemas/attachment';
import { objectStore } from '@/lib/storage/object-store';
import { prepareFile } from '@/lib/storage/prepare-file';

export const GET = handle({ query: attachmentsQuery }, (ctx, { query }) => listAttachments(ctx, query));

export const POST = handle({ query: addAttachmentInput, status: 201 }, (ctx, { query, request }) =>
  takingTurns(() =>
    addAttachment(ctx, query, {
      store: objectStore,
      prepare: prepareFile,
      readFile: () => readBytes(request),
    }),
  ),
);
