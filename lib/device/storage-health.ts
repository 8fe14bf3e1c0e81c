/** Below this a photo is not taken before the person was told, bytes. */
const LOW_BYTES = 100_000_000;

export interface StorageHealth {
  /** The browser has promised not to clear this storage by itself; null where it cannot say. */
  persistent: boolean | null;
  freeBytes: number | null;
  low: boolean;
}

export async function storageHealth(): Promise<StorageHealth> {
  const storage = typeof navigator === 'undefined' ? undefined : navigator.storage;
  const persistent = storage?.persisted ? await storage.persisted() : null;
  const { quota, usage } = storage?.estimate ? await storage.estimate() : {};
  const freeBytes = quota === undefined || usage === undefined ? null : Math.max(0, quota - usage);
  return { persistent, freeBytes, low: freeBytes !== null && freeBytes < LOW_BYTES };
}

/** Asks the browser to keep this storage; at a meaningful tap. What it answers is its own affair. */
export async function askToPersist(): Promise<boolean | null> {
  return navigator.storage?.persist ? navigator.storage.persist() : null;
}
