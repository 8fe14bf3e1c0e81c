import type { AccountDatabase } from '../database';
import type { EmergencyCard, EntryRow, PhotoRow, SyncStatus } from '../rows';

export interface HeldCounts {
  entries: number;
  photos: number;
  /** Entries that the server refused. */
  refused: number;
  refusedPhotos: number;
  /** madeAt of the oldest entry held here, ms; null when none is. */
  oldestAt: number | null;
}

/** What is still only on this phone. */
export async function getHeldCounts(db: AccountDatabase): Promise<HeldCounts> {
  const held = await db.entries.where('sync').equals('held').toArray();
  const [photos, refused, refusedPhotos] = await Promise.all([
    db.photos.where('sync').equals('held').count(),
    db.entries.where('sync').equals('refused').count(),
    db.photos.where('sync').equals('refused').count(),
  ]);
  const oldestAt = held.reduce<number | null>(
    (oldest, { madeAt }) => (oldest === null ? madeAt : Math.min(oldest, madeAt)),
    null,
  );
  return { entries: held.length, photos, refused, refusedPhotos, oldestAt };
}

/** Entries that the server refused, for the tray. */
export function getRefused(db: AccountDatabase): Promise<EntryRow[]> {
  return db.entries.where('sync').equals('refused').sortBy('madeAt');
}

export function getRefusedPhotos(db: AccountDatabase): Promise<PhotoRow[]> {
  return db.photos.where('sync').equals('refused').toArray();
}

export const noSyncYet: SyncStatus = {
  state: 'idle',
  lastSuccessAt: null,
  lastError: null,
  nextTryAt: null,
  clockOffsetMs: null,
};

export async function getSyncStatus(db: AccountDatabase): Promise<SyncStatus> {
  return { ...noSyncYet, ...((await db.facts.get('syncStatus'))?.value as Partial<SyncStatus> | undefined) };
}

export async function getDraft(db: AccountDatabase, key: string): Promise<string> {
  return (await db.drafts.get(key))?.text ?? '';
}

export async function getEmergencyCard(db: AccountDatabase): Promise<EmergencyCard | null> {
  return ((await db.facts.get('emergencyCard'))?.value as EmergencyCard | undefined) ?? null;
}

/** Bytes of a photo on this phone, or undefined where only the server has them. */
export async function getPhoto(db: AccountDatabase, buildId: string, sha256: string): Promise<PhotoRow | undefined> {
  return db.photos.get([buildId, sha256]);
}
