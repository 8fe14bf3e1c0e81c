import Dexie, { type Table } from 'dexie';
import { getDeviceId } from './device-database';
import { refoldAfterUpdate } from './refold-after-update';
import type { BuildRow, DraftRow, EntryRow, FactRow, PhotoRow } from './rows';
import type { PlanDocument } from '../domain/plan/document';

/** Longest wait for the phone's storage to open, ms: some browsers hang here. */
const OPEN_LIMIT_MS = 8_000;

/** The records of one account on this phone. Written only by lib/store/mutations and lib/sync. */
export class AccountDatabase extends Dexie {
  builds!: Table<BuildRow, string>;
  plans!: Table<{ contentHash: string; plan: PlanDocument }, string>;
  entries!: Table<EntryRow, string>;
  photos!: Table<PhotoRow, [string, string]>;
  drafts!: Table<DraftRow, string>;
  facts!: Table<FactRow, string>;

  /** Clock of this phone, ms; replaced in tests. */
  clock: () => number = Date.now;

  constructor(
    readonly accountId: string,
    readonly deviceId: string,
  ) {
    super(databaseName(accountId), { chromeTransactionDurability: 'strict' });
    // Older versions stay listed for ever and only fields are added: an older cached program may open a newer database.
    this.version(1).stores({
      builds: 'id, lastUsedAt',
      plans: 'contentHash',
      entries: 'id, buildId, sync, [buildId+sync]',
      photos: '[buildId+sha256], buildId, sync',
      drafts: 'key',
      facts: 'key',
    });
  }
}

export function databaseName(accountId: string): string {
  return `holdfast-${accountId}`;
}

export class StorageProblem extends Error {
  override readonly name = 'StorageProblem';
  constructor(
    readonly code: 'slow' | 'blocked' | 'refused',
    message: string,
  ) {
    super(message);
  }
}

const opening = new Map<string, Promise<AccountDatabase>>();

/**
 * The database of an account, opened once for each page.
 *
 * @throws StorageProblem in words: storage refused (private window), held by another tab, or too slow
 */
export function openAccountDatabase(accountId: string): Promise<AccountDatabase> {
  let database = opening.get(accountId);
  if (!database) {
    database = open(accountId).catch((error: unknown) => {
      opening.delete(accountId);
      throw error;
    });
    opening.set(accountId, database);
  }
  return database;
}

/** Forgets the open handle, so that the next call opens afresh. */
export async function closeAccountDatabase(accountId: string): Promise<void> {
  const database = await opening.get(accountId);
  opening.delete(accountId);
  database?.close();
}

async function open(accountId: string): Promise<AccountDatabase> {
  const db = new AccountDatabase(accountId, await getDeviceId());
  let blocked = false;
  db.on('blocked', () => {
    blocked = true;
  });
  db.on('versionchange', () => {
    // Another tab brings a newer version: let it, and tell the page to reload when it next looks.
    opening.delete(accountId);
    db.close();
    if (typeof window !== 'undefined') window.dispatchEvent(new Event('holdfast-storage-moved'));
  });
  const limit = new Promise<never>((_, reject) =>
    setTimeout(
      () =>
        reject(
          blocked
            ? new StorageProblem(
                'blocked',
                'Another tab holds an older Holdfast open. Close the other tabs, then try again.',
              )
            : new StorageProblem('slow', 'The phone’s storage does not answer. Close Holdfast and open it again.'),
        ),
      OPEN_LIMIT_MS,
    ),
  );
  try {
    await Promise.race([db.open(), limit]);
  } catch (error) {
    if (error instanceof StorageProblem) throw error;
    throw new StorageProblem(
      'refused',
      'This browser keeps nothing for Holdfast, as private windows do. Open it in an ordinary window.',
    );
  }
  await refoldAfterUpdate(db);
  return db;
}
