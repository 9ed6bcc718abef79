import { handlePublic } from '@/lib/http/handle';

export const dynamic = 'force-dynamic';

/** The process is up. Asks nobody else. */
export const GET = handlePublic({}, () => Promise.resolve({ status: 'up' }));
