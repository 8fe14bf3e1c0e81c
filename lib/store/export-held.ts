import type { AccountDatabase } from './database';
import type { EntryRow } from './rows';

export const HELD_FORMAT = 'holdfast-held';

export interface HeldFile {
  format: typeof HELD_FORMAT;
  version: 1;
  accountId: string;
  deviceId: string;
  madeAt: number;
  entries: Omit<EntryRow, 'sync'>[];
  photos: { buildId: string; sha256: string; mediaType: string; base64: string }[];
}

/** Everything that is only on this phone, as the text of a file: held and refused entries, and photos not yet sent. */
export async function exportHeld(db: AccountDatabase): Promise<string> {
  const entries = await db.entries.where('sync').anyOf('held', 'refused').toArray();
  const photos = await db.photos.where('sync').anyOf('held', 'refused').toArray();
  const file: HeldFile = {
    format: HELD_FORMAT,
    version: 1,
    accountId: db.accountId,
    deviceId: db.deviceId,
    madeAt: db.clock(),
    entries: entries.map(({ sync: _sync, ...entry }) => entry as Omit<EntryRow, 'sync'>),
    photos: photos.map(({ buildId, sha256, mediaType, bytes }) => ({
      buildId,
      sha256,
      mediaType,
      base64: toBase64(bytes),
    })),
  };
  return JSON.stringify(file, null, 2);
}

function toBase64(bytes: ArrayBuffer): string {
  const view = new Uint8Array(bytes);
  let binary = '';
  // In slices, since a call takes only so many arguments.
  for (let from = 0; from < view.length; from += 32_768)
    binary += String.fromCharCode(...view.subarray(from, from + 32_768));
  return btoa(binary);
}
