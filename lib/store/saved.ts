import Dexie from 'dexie';

/** Answer of every mutation. `ok` only after the transaction has completed (S1). */
export type Saved = { ok: true; entryId: string } | NotSaved;

export interface NotSaved {
  ok: false;
  code: 'full' | 'lost' | 'invalid' | 'no-build' | 'not-yours';
  /** What happened and what to do. */
  message: string;
}

const RETRIES = 3;

/**
 * Runs a write and answers only when it is durable or has failed for good. A lost connection to the storage is reopened
 * and the write repeated at most three times: entries have ids, so repeating is harmless.
 */
export async function durably<T>(db: Dexie, write: () => Promise<T>): Promise<T | NotSaved> {
  for (let attempt = 1; ; attempt += 1) {
    try {
      return await write();
    } catch (error) {
      const cause = causeOf(error);
      if (cause === 'QuotaExceededError') {
        return {
          ok: false,
          code: 'full',
          message: 'Not saved: this phone’s storage is full. Free some space, for example old videos, then try again.',
        };
      }
      if (!LOST.has(cause)) throw error;
      if (attempt > RETRIES) {
        return {
          ok: false,
          code: 'lost',
          message: 'Not saved: the phone’s storage was lost. Close Holdfast, open it again and look at the last entry.',
        };
      }
      db.close({ disableAutoOpen: false });
      await db.open();
    }
  }
}

const LOST: ReadonlySet<string> = new Set([
  'DatabaseClosedError',
  'InvalidStateError',
  'UnknownError',
  'AbortError',
  'OpenFailedError',
  'TransactionInactiveError',
]);

/** Name of what really went wrong: on a full disk some browsers only abort the transaction. */
function causeOf(error: unknown): string {
  for (let inner = error; inner; inner = (inner as { inner?: unknown }).inner) {
    const { name } = inner as { name?: string };
    if (name === 'QuotaExceededError') return name;
  }
  return (error as { name?: string } | null)?.name ?? '';
}
