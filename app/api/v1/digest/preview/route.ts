import { previewDigest } from '@/lib/actions/preview-digest';
import { handle } from '@/lib/http/handle';
import { digestQuery } from '@/lib/schemas/digest';

export const GET = handle({ query: digestQuery }, (ctx, { query }) => previewDigest(ctx, query));
