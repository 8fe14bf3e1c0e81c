import { foldEntries } from '../../domain/build/fold';
import type { AccountDatabase } from '../database';
import { getEntries } from '../queries/builds';
import { getRefused, getRefusedPhotos } from '../queries/held';
import { durably, type NotSaved } from '../saved';

/**
 * Holds all that was refused once more, photos too, for when what stood in the way has been put right: a helper taken
 * back into the crew, a server mended. The entries count again at once, as this phone's own.
 */
export function sendAgain(db: AccountDatabase): Promise<void | NotSaved> {
  return durably(db, () =>
    db.transaction('rw', db.builds, db.entries, db.photos, async () => {
      const entries = await getRefused(db);
      for (const { id } of entries) await db.entries.update(id, { sync: 'held', refusal: undefined });
      for (const { buildId, sha256 } of await getRefusedPhotos(db))
        await db.photos.update([buildId, sha256], { sync: 'held', refusal: undefined });
      for (const buildId of new Set(entries.map((entry) => entry.buildId)))
        await db.builds.update(buildId, { state: foldEntries(await getEntries(db, buildId)) });
    }),
  );
}
