import { isDevelopment } from '@/lib/env';

/**
 * What a page of ours may load and who may frame it: scripts by this nonce alone, everything else from ourselves,
 * no frame anywhere. Styles are let through inline, for the calendar and measured widths write them, and the calendar's
 * styles bring a font along; the development
 * server evaluates its modules.
 */
export function contentSecurityPolicy(nonce: string): string {
  return [
    `default-src 'self'`,
    `script-src 'self' 'nonce-${nonce}' 'strict-dynamic'${isDevelopment() ? " 'unsafe-eval'" : ''}`,
    `style-src 'self' 'unsafe-inline'`,
    `img-src 'self' data: blob:`,
    `font-src 'self' data:`,
    `connect-src 'self'`,
    `object-src 'none'`,
    `base-uri 'none'`,
    `form-action 'self'`,
    `frame-ancestors 'none'`,
  ].join('; ');
}
