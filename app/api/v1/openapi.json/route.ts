import { handlePublic } from '@/lib/http/handle';
import { describeApi } from '@/lib/schemas/openapi-document';

export const GET = handlePublic({}, () => Promise.resolve(describeApi('1')));
