import { liveQuery } from 'dexie';
import type { AccountDatabase } from '../store/database';
import { getSettings } from '../store/device-database';
import { createSyncRunner, type SyncRunner } from './runner';

/** How long a frozen tab's lock is waited for before this tab sends all the same, ms. */
const LOCK_WAIT_MS = 5_000;

/** The agent of this page: runs on each write, when the page is shown, when signal returns, and by the clock. */
export function startBrowserRunner(db: AccountDatabase): SyncRunner {
  const runner = createSyncRunner({
    db,
    fetch: (input, init) => fetch(input, init),
    now: Date.now,
    random: Math.random,
    setTimer: (run, ms) => {
      const timer = setTimeout(run, ms);
      return () => clearTimeout(timer);
    },
    exclusively: (run) => withLock(`holdfast-sync-${db.accountId}`, run),
    photosAllowed: async () => !(await getSettings()).photosOnWifiOnly || !isMetered(),
  });
  const wake = () => {
    if (document.visibilityState === 'visible') void runner.syncNow();
  };
  const writes = liveQuery(() =>
    Promise.all([
      db.entries.where('sync').equals('held').primaryKeys(),
      db.photos.where('sync').equals('held').primaryKeys(),
    ]),
  ).subscribe(([entries, photos]) => {
    if (entries.length + photos.length > 0) void runner.syncNow();
  });
  window.addEventListener('online', wake);
  window.addEventListener('pageshow', wake);
  document.addEventListener('visibilitychange', wake);
  runner.start();
  return {
    ...runner,
    stop: () => {
      writes.unsubscribe();
      window.removeEventListener('online', wake);
      window.removeEventListener('pageshow', wake);
      document.removeEventListener('visibilitychange', wake);
      runner.stop();
    },
  };
}

async function withLock(name: string, run: () => Promise<void>): Promise<void> {
  if (!('locks' in navigator)) return run();
  let ran = false;
  try {
    await navigator.locks.request(name, { signal: AbortSignal.timeout(LOCK_WAIT_MS) }, () => {
      ran = true;
      return run();
    });
  } catch (error) {
    if (ran) throw error;
    // Another tab holds the lock and does not let go, perhaps frozen. Sending twice is harmless (S2).
    await run();
  }
}

function isMetered(): boolean {
  const { connection } = navigator as Navigator & { connection?: { type?: string; saveData?: boolean } };
  return connection?.saveData === true || connection?.type === 'cellular';
}
