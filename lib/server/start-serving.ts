import 'server-only';
import { env } from './env';
import { startJobs } from './jobs/queue';
import { log } from './log';
import { watchAddresses } from './request/watch-addresses';

/** What a web server does besides answering. Does not wait for the database. */
export function startServing(): void {
  watchAddresses(env().TRUSTED_PROXIES);
  startJobs().catch((error: unknown) => {
    log.error({ err: error }, 'the job queue did not start; letters wait until it does');
  });
}
