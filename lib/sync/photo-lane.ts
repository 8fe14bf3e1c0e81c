import { photoAnswerSchema } from '../domain/build/wire';
import { exchange } from './exchange';
import { isNotEver, type LaneDeps, type LaneEnd } from './log-lane';

const TIME_LIMIT_MS = 120_000;

/** Sends photos one at a time, smallest risk first: oldest. Bytes stay here until the server has named their hash (S9). */
export async function runPhotoLane({ db, fetch, now }: LaneDeps): Promise<LaneEnd> {
  const held = await db.photos.where('sync').equals('held').sortBy('addedAt');
  for (const photo of held) {
    const result = await exchange({
      fetch,
      now,
      timeLimitMs: TIME_LIMIT_MS,
      url: `/api/builds/${photo.buildId}/photos/${photo.sha256}`,
      init: { method: 'PUT', headers: { 'content-type': photo.mediaType }, body: photo.bytes },
      judge: (json) => {
        const parsed = photoAnswerSchema.safeParse(json);
        return parsed.success && parsed.data.sha256 === photo.sha256 && parsed.data.bytes === photo.length
          ? parsed.data
          : null;
      },
    });
    const key: [string, string] = [photo.buildId, photo.sha256];
    if (result.outcome === 'answer') await db.photos.update(key, { sync: 'confirmed' });
    else if (isNotEver(result)) {
      await db.photos.update(key, { sync: 'refused', refusal: result.message });
    } else return result;
  }
  return { outcome: 'done' };
}
