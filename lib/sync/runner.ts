import type { AccountDatabase } from '../store/database';
import { getHeldCounts, getSyncStatus } from '../store/queries/held';
import type { SyncStatus } from '../store/rows';
import { backoffMs } from './backoff';
import type { Fetch } from './exchange';
import { runLogLane, type LaneEnd } from './log-lane';
import { runPhotoLane } from './photo-lane';

export interface RunnerDeps {
  db: AccountDatabase;
  fetch: Fetch;
  now: () => number;
  random: () => number;
  setTimer: (run: () => void, ms: number) => () => void;
  /** Runs one at a time over all tabs, as a courtesy: sending twice is harmless. Given up when it takes long. */
  exclusively?: (run: () => Promise<void>) => Promise<void>;
  /** False while the person wants photos on Wi-Fi only and this is not. */
  photosAllowed?: () => Promise<boolean>;
}

export interface SyncRunner {
  start: () => void;
  stop: () => void;
  /** Runs now, or once more after the run under way; resolves when that run has ended. */
  syncNow: () => Promise<void>;
}

/** Asks for others' entries at least so often while the page is open, ms. */
const POLL_MS = 30_000;

/** The agent that sends what is held here and takes what others did. One for each account and page. */
export function createSyncRunner(deps: RunnerDeps): SyncRunner {
  const { db, now, random, setTimer, exclusively = (run) => run() } = deps;
  let running: Promise<void> | null = null;
  let again = false;
  let stopped = true;
  let failures = 0;
  let cancelTimer: (() => void) | null = null;

  async function setStatus(changes: Partial<SyncStatus>): Promise<void> {
    await db.transaction('rw', db.facts, async () => {
      await db.facts.put({ key: 'syncStatus', value: { ...(await getSyncStatus(db)), ...changes } });
    });
  }

  async function runLanes(): Promise<LaneEnd> {
    let clockOffsetMs: number | undefined;
    for (const { id } of await db.builds.toArray()) {
      const end = await runLogLane(deps, id);
      if (end.outcome !== 'done') return end;
      clockOffsetMs = end.clockOffsetMs ?? clockOffsetMs;
    }
    const photos = (await deps.photosAllowed?.()) === false ? ({ outcome: 'done' } as const) : await runPhotoLane(deps);
    return photos.outcome === 'done' ? { outcome: 'done', clockOffsetMs } : photos;
  }

  async function run(): Promise<void> {
    const { entries, photos } = await getHeldCounts(db);
    if (entries + photos > 0) await setStatus({ state: 'sending', nextTryAt: null });
    const end = await runLanes();
    if (end.outcome === 'done') {
      failures = 0;
      await setStatus({
        state: 'idle',
        lastSuccessAt: now(),
        lastError: null,
        nextTryAt: null,
        ...(end.clockOffsetMs === undefined ? {} : { clockOffsetMs: end.clockOffsetMs }),
      });
      schedule(POLL_MS);
    } else if (end.outcome === 'later') {
      failures += 1;
      const waitMs = Math.max(end.retryAfterMs ?? 0, backoffMs(failures, random()));
      const state = end.message.startsWith('No signal') ? 'no-signal' : 'waiting';
      await setStatus({ state, lastError: end.message, nextTryAt: now() + waitMs });
      schedule(waitMs);
    } else {
      await setStatus({
        state: end.outcome === 'sign-in' ? 'sign-in' : 'update-needed',
        lastError: end.message,
        nextTryAt: null,
      });
    }
  }

  function schedule(ms: number): void {
    cancelTimer?.();
    cancelTimer = stopped ? null : setTimer(() => void syncNow(), ms);
  }

  async function guarded(): Promise<void> {
    try {
      await exclusively(run);
    } catch (error) {
      failures += 1;
      const waitMs = backoffMs(failures, random());
      schedule(waitMs);
      // Storage may be what failed; then the banner of the failed write tells the person, and this line would fail too.
      await setStatus({
        state: 'waiting',
        lastError: error instanceof Error ? error.message : String(error),
        nextTryAt: now() + waitMs,
      }).catch((inner: unknown) => console.error('The state of sending could not be written down.', inner));
    }
  }

  function syncNow(): Promise<void> {
    if (running) {
      again = true;
      return running;
    }
    running = (async () => {
      do {
        again = false;
        await guarded();
      } while (again && !stopped);
    })().finally(() => {
      running = null;
    });
    return running;
  }

  return {
    start: () => {
      stopped = false;
      void syncNow();
    },
    stop: () => {
      stopped = true;
      cancelTimer?.();
      cancelTimer = null;
    },
    syncNow,
  };
}
