import { getServiceRecord } from '@/lib/actions/get-service-record';
import { handle } from '@/lib/http/handle';
import { drawServiceRecord } from '@/lib/papers/draw-service-record';
import { idParams } from '@/lib/schemas/common';

export const GET = handle({ params: idParams }, async (ctx, { params }) => {
  const { record, fileName } = await getServiceRecord(ctx, params.id);
  const pdf = await drawServiceRecord(record);
  return new Response(new Uint8Array(pdf), {
    headers: {
      'content-type': 'application/pdf',
      'content-disposition': `inline; filename="${fileName}"`,
      'cache-control': 'private, no-store',
      'x-content-type-options': 'nosniff',
    },
  });
});
