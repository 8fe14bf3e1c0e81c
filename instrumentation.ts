/**
 * Runs once when a web server starts, before its first request: from then on every request carries the network address
 * that it came from, and the server works the job queue. Where the database is away at that moment, the first letter
 * starts the queue instead.
 */
export async function register(): Promise<void> {
  if (process.env.NEXT_RUNTIME !== 'nodejs') return;
  const { startServing } = await import('@/lib/server/start-serving');
  startServing();
}
