/** Runs once when the web server starts, before the first request. */
export async function register(): Promise<void> {
  // Next compiles this for its edge runtime too, which has no sockets, and leaves the import out there.
  if (process.env.NEXT_RUNTIME === 'nodejs') {
    const { writeSocketAddress } = await import('@/lib/http/socket-address');
    writeSocketAddress();
  }
}
