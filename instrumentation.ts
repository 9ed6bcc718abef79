/** Runs once when the web server starts, before the first request. */
export async function register(): Promise<void> {
  const { writeSocketAddress } = await import('@/lib/http/socket-address');
  writeSocketAddress();
}
