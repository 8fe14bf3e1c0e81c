import { photoAnswerSchema } from '../domain/build/wire';
import type { PhotoRow } from '../store/rows';
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

/**
 * Bytes of a photo: from this phone, else from the server, kept here as confirmed. Null where neither can give them now.
 */
export async function fetchPhoto(
  { db, fetch, now }: LaneDeps,
  { buildId, sha256, mediaType }: { buildId: string; sha256: string; mediaType: string },
): Promise<PhotoRow | null> {
  const known = await db.photos.get([buildId, sha256]);
  if (known) return known;
  let response: Response;
  try {
    response = await fetch(`/api/builds/${buildId}/photos/${sha256}`, { signal: AbortSignal.timeout(TIME_LIMIT_MS) });
  } catch {
    // No signal: the screen shows that the picture is not on this phone yet.
    return null;
  }
  const type = response.headers.get('content-type') ?? '';
  if (response.status !== 200 || !type.startsWith('image/')) return null;
  const bytes = await response.arrayBuffer();
  const row: PhotoRow = {
    buildId,
    sha256,
    bytes,
    mediaType: type || mediaType,
    length: bytes.byteLength,
    sync: 'confirmed',
    addedAt: now(),
  };
  await db.photos.put(row);
  return row;
}
