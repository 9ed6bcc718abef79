import { checkReady } from '@/lib/actions/check-ready';
import { handlePublic } from '@/lib/http/handle';

export const dynamic = 'force-dynamic';

export const GET = handlePublic({}, (ctx) => checkReady(ctx));
