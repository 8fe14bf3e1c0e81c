import 'server-only';
import { createHash } from 'node:crypto';
import { QueryTypes } from 'sequelize';
import { db } from './db';
import { AppError } from './errors';

/** At most `limit` tries within `windowS` seconds of the first. */
interface Limit {
  limit: number;
  windowS: number;
}

const MINUTE_S = 60;
const HOUR_S = 60 * MINUTE_S;

/**
 * What is throttled and how far. An account is counted together with the network address it is tried from, strictly, so
 * that a stranger who tries cannot lock its owner out; and alone, loosely, against many addresses trying one account.
 */
export const limits = {
  'sign-in:account-from-address': { limit: 10, windowS: 15 * MINUTE_S },
  'sign-in:account': { limit: 50, windowS: 15 * MINUTE_S },
  'sign-in:address': { limit: 100, windowS: 15 * MINUTE_S },
  'letter:account': { limit: 5, windowS: HOUR_S },
  'letter:address': { limit: 30, windowS: HOUR_S },
  'link:token': { limit: 10, windowS: 15 * MINUTE_S },
  'link:address': { limit: 60, windowS: 15 * MINUTE_S },
  'password:account': { limit: 10, windowS: 15 * MINUTE_S },
} as const satisfies Record<string, Limit>;

export type Throttled = keyof typeof limits;

/**
 * Counts one try and refuses it when there were too many. The count is one atomic statement in the database, so several
 * servers agree on it; a refused try is counted too, but never makes the wait longer.
 *
 * @param what     which limit
 * @param subject  whose tries these are; kept only as a hash
 * @throws AppError `too-many` with the seconds to wait
 */
export async function throttle(what: Throttled, subject: string): Promise<void> {
  const { limit, windowS } = limits[what];
  const rows = await db().sequelize.query<{ count: number; wait_s: number }>(
    `INSERT INTO throttles AS t (key, count, window_ends_at)
     VALUES (:key, 1, clock_timestamp() + make_interval(secs => :windowS))
     ON CONFLICT (key) DO UPDATE SET
       count = CASE WHEN t.window_ends_at <= clock_timestamp() THEN 1 ELSE least(t.count + 1, 1000000) END,
       window_ends_at = CASE WHEN t.window_ends_at <= clock_timestamp() THEN excluded.window_ends_at ELSE t.window_ends_at END
     RETURNING count, greatest(1, ceil(extract(epoch FROM window_ends_at - clock_timestamp())))::int AS wait_s`,
    { replacements: { key: throttleKey(what, subject), windowS }, type: QueryTypes.SELECT },
  );
  const row = rows[0];
  if (!row) throw new Error('The throttle statement returned no row.');
  if (row.count <= limit) return;
  throw new AppError('too-many', `That was tried too often. Wait ${waitWords(row.wait_s)}, then try again.`, {
    retryAfterS: row.wait_s,
  });
}

/** Forgets the tries of someone who has just shown that they are who they say. */
export async function forgetTries(what: Throttled, subject: string): Promise<void> {
  await db().models.Throttle.destroy({ where: { key: throttleKey(what, subject) } });
}

function throttleKey(what: Throttled, subject: string): string {
  return `${what}:${createHash('sha256').update(subject).digest('hex')}`;
}

function waitWords(seconds: number): string {
  if (seconds < 2 * MINUTE_S) return `${seconds} seconds`;
  return `${Math.ceil(seconds / MINUTE_S)} minutes`;
}
