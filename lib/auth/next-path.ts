/** The request header in which `proxy.ts` tells a page its own path and query. */
export const PATH_HEADER = 'x-wakewright-path';

/**
 * Where to go after signing in: a path of ours, or '/' for anything else. A browser reads `//host`, `/\host` and
 * addresses with tabs or line breaks as another site, so none of those pass.
 */
export function safeNext(next: string | null | undefined): string {
  if (!next || !/^\/(?![/\\])[\x21-\x7e]*$/.test(next) || next.includes('\\')) return '/';
  return /^\/(sign-in|setup|forgot|reset|invitation|api)(\/|\?|$)/.test(next) ? '/' : next;
}
