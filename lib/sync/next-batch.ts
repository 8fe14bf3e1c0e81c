import { MAX_BATCH_BYTES, MAX_BATCH_ENTRIES } from '../domain/build/wire';
import type { AccountDatabase } from '../store/database';
import type { EntryRow } from '../store/rows';

/** What of an entry goes over the wire: standing and local marks stay here. */
export function wireEntry({ id, buildId, deviceId, madeAt, seen, kind, v, target, value }: EntryRow) {
  return { id, buildId, deviceId, madeAt, seen, kind, v, target, value };
}

/** Entries of a build that are held here, oldest first, as many as one request takes. */
export async function nextBatch(db: AccountDatabase, buildId: string, most = MAX_BATCH_ENTRIES): Promise<EntryRow[]> {
  const held = await db.entries.where({ buildId, sync: 'held' }).toArray();
  // Ids are UUID v7 made in order on this phone, so they keep the order of making where the clock jumped.
  held.sort((a, b) => (a.id < b.id ? -1 : 1));
  const batch: EntryRow[] = [];
  let bytes = 0;
  for (const row of held.slice(0, most)) {
    bytes += new TextEncoder().encode(JSON.stringify(wireEntry(row))).length;
    if (bytes > MAX_BATCH_BYTES && batch.length > 0) break;
    batch.push(row);
  }
  return batch;
}
