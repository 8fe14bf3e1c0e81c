import { LOG_ANSWER_FORMAT, logAnswerSchema, MAX_BATCH_ENTRIES, type LogAnswer } from '../domain/build/wire';
import type { AccountDatabase } from '../store/database';
import { exchange, type Fetch, type NotEver, type NotNow } from './exchange';
import { nextBatch, wireEntry } from './next-batch';
import { refuseEntries, takeAnswer } from './take-answer';

export interface LaneDeps {
  db: AccountDatabase;
  fetch: Fetch;
  now: () => number;
}

/** How a lane ended: everything went through, or why it stopped. */
export type LaneEnd = { outcome: 'done'; clockOffsetMs?: number } | NotNow;

const TIME_LIMIT_MS = 20_000;
/** Requests for one build in one run; more waits for the next run, so that one build never starves another. */
const MOST_ROUNDS = 200;

/** Sends what is held of a build and takes others' entries, until both sides have said all. */
export async function runLogLane(deps: LaneDeps, buildId: string): Promise<LaneEnd> {
  const { db, now } = deps;
  let most = MAX_BATCH_ENTRIES;
  let clockOffsetMs: number | undefined;
  let restored = false;
  for (let round = 0; round < MOST_ROUNDS; round += 1) {
    const batch = await nextBatch(db, buildId, most);
    const build = await db.builds.get(buildId);
    if (!build) return { outcome: 'done', clockOffsetMs };
    const ids = batch.map(({ id }) => id);
    const result = await exchange<LogAnswer>({
      fetch: deps.fetch,
      now,
      timeLimitMs: TIME_LIMIT_MS,
      url: `/api/builds/${buildId}/log`,
      init: {
        method: 'POST',
        headers: { 'content-type': 'application/json' },
        body: JSON.stringify({
          deviceId: db.deviceId,
          accountId: db.accountId,
          cursor: build.cursor,
          sentAt: now(),
          entries: batch.map(wireEntry),
        }),
      },
      judge: (json) => judgeLogAnswer(json, buildId, ids),
    });
    if (isNotEver(result)) {
      if (batch.length === 0) return { outcome: 'later', message: result.message };
      if (result.outcome === 'too-much' && batch.length > 1) {
        most = Math.ceil(batch.length / 2);
      } else {
        await refuseEntries(db, buildId, ids, result.message);
        most = MAX_BATCH_ENTRIES;
      }
      continue;
    }
    if (result.outcome !== 'answer') return result;
    const { answer, sentAt, receivedAt } = result;
    clockOffsetMs = Math.round(answer.serverTime - (sentAt + receivedAt) / 2);
    const taken = await takeAnswer(db, answer);
    // A second restore within one run would go round for ever; the next run takes it up.
    if (taken.restored && restored) return { outcome: 'later', message: 'The server is being restored.' };
    restored ||= taken.restored;
    const left = await db.entries.where({ buildId, sync: 'held' }).count();
    if (!taken.more && left === 0) return { outcome: 'done', clockOffsetMs };
  }
  return { outcome: 'done', clockOffsetMs };
}

/** S8: our format, our build, and every id that was sent either accepted or refused. */
function judgeLogAnswer(json: unknown, buildId: string, ids: readonly string[]): LogAnswer | null {
  const parsed = logAnswerSchema.safeParse(json);
  if (!parsed.success || parsed.data.format !== LOG_ANSWER_FORMAT || parsed.data.buildId !== buildId) return null;
  const named = new Set([...parsed.data.accepted, ...parsed.data.refused].map(({ id }) => id));
  return ids.every((id) => named.has(id)) ? parsed.data : null;
}

export function isNotEver(result: { outcome: string }): result is NotEver {
  return result.outcome === 'too-much' || result.outcome === 'refused';
}
