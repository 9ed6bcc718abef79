/** The answer to what was done and has nothing to show: 204, without a body. */
export function noContent(): Response {
  return new Response(null, { status: 204, headers: { 'cache-control': 'no-store' } });
}
