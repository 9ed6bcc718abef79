import { unsubscribe } from '@/lib/actions/unsubscribe';
import { handlePublic } from '@/lib/http/handle';
import { plainPage } from '@/lib/http/plain-page';
import { unsubscribeParams } from '@/lib/schemas/digest';

/** A mail program may open the address to look at it: it asks first, and changes nothing. */
export const GET = handlePublic({ params: unsubscribeParams }, () =>
  Promise.resolve(
    plainPage({
      title: 'Stop the weekly letter?',
      text: 'You will get no more of the letters that come on Mondays. A manager can switch them on again on the page “Digest”.',
      button: 'Stop the letters',
    }),
  ),
);

/** RFC 8058: one POST without cookies, from a mail program or from the page above, and no redirect. */
export const POST = handlePublic({ params: unsubscribeParams }, async (ctx, { params }) => {
  await unsubscribe(ctx, params);
  return plainPage({
    title: 'The weekly letter is stopped',
    text: 'You will get no more of the letters that come on Mondays. You can close this page.',
  });
});
