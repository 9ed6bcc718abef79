import { sendDigestNow } from '@/lib/actions/send-digest-now';
import { handle } from '@/lib/http/handle';

export const POST = handle({ status: 202 }, (ctx) => sendDigestNow(ctx));
