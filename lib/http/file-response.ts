import type { AttachmentFile } from '@/lib/actions/read-attachment';

/** A file as it is served: pictures shown, documents only downloaded, neither ever taken for a page. */
export function fileResponse({ bytes, contentType, kind, name }: AttachmentFile): Response {
  const fileName = encodeURIComponent(name).replaceAll("'", '%27');
  return new Response(new Uint8Array(bytes), {
    headers: {
      'content-type': contentType,
      'content-disposition': `${kind === 'document' ? 'attachment' : 'inline'}; filename*=UTF-8''${fileName}`,
      'content-security-policy': "default-src 'none'; sandbox; frame-ancestors 'none'",
      'cache-control': 'private, max-age=3600',
      'cross-origin-resource-policy': 'same-origin',
      'x-content-type-options': 'nosniff',
    },
  });
}
