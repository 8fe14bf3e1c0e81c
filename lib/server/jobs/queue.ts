import 'server-only';
import PgBoss from 'pg-boss';
import { env } from '../env';
import { log } from '../log';
import { deliverLetter } from '../mail/deliver-letter';
import type { LetterOrder } from '../mail/letter-order';
import { sweep } from './sweep';

const MAIL = 'mail';
const SWEEP = 'sweep';

/** Tries again after about 15 s, 30 s, 1 min and so on: ten tries reach over four hours. */
const mailRetries = { retryLimit: 10, retryDelay: 15, retryBackoff: true, expireInSeconds: 90 };

interface Jobs {
  boss: PgBoss;
  mailWorker: string;
}

const shared = globalThis as typeof globalThis & { holdfastJobs?: Promise<Jobs> };

/**
 * The queue, kept in the database of the records (schema pgboss) and worked by every web server: what one took and did
 * not finish, another takes up. Started with the server, and by the first letter where that did not succeed. A letter
 * whose server stopped between sending and noting it may go out twice; none is lost.
 */
export function startJobs(): Promise<Jobs> {
  shared.holdfastJobs ??= start().catch((error: unknown) => {
    delete shared.holdfastJobs;
    throw error;
  });
  return shared.holdfastJobs;
}

async function start(): Promise<Jobs> {
  const boss = new PgBoss({ connectionString: env().DATABASE_URL, max: 3, application_name: 'holdfast jobs' });
  boss.on('error', (error) => log.error({ err: error }, 'the job queue met an error'));
  await boss.start();
  await boss.createQueue(MAIL, { name: MAIL, ...mailRetries });
  await boss.createQueue(SWEEP, { name: SWEEP, policy: 'short', retryLimit: 0, expireInSeconds: 600 });
  const mailWorker = await boss.work<LetterOrder>(MAIL, { batchSize: 1, pollingIntervalSeconds: 5 }, async (jobs) => {
    for (const job of jobs) await deliverLetter(job.data);
  });
  await boss.work(SWEEP, { pollingIntervalSeconds: 60 }, () => sweep());
  await boss.schedule(SWEEP, '17 * * * *');
  return { boss, mailWorker };
}

/**
 * Puts a letter in the queue; it is stored when this resolves, and sent afterwards.
 *
 * @throws Error when the database cannot be reached
 */
export async function orderLetter(order: LetterOrder): Promise<void> {
  const { boss, mailWorker } = await startJobs();
  await boss.send(MAIL, order, mailRetries);
  boss.notifyWorker(mailWorker);
}

/** Lets running jobs finish and closes the queue's connections. */
export async function stopJobs(): Promise<void> {
  const running = shared.holdfastJobs;
  delete shared.holdfastJobs;
  if (running) await (await running).boss.stop({ graceful: true, wait: true, timeout: 10_000 });
}
