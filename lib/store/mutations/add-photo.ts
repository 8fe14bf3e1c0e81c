import { v7 } from 'uuid';
import type { EntryValueInput } from '../../domain/build/kinds';
import type { AccountDatabase } from '../database';
import { recordEntry } from '../record-entry';
import type { Saved } from '../saved';

export type NewPhoto = { buildId: string; bytes: ArrayBuffer; photoId?: string } & Omit<
  EntryValueInput<'photo-taken'>,
  'bytes'
>;

/** Keeps the bytes of a photo and its entry in one transaction. */
export function addPhoto(db: AccountDatabase, { buildId, bytes, photoId = v7(), ...facts }: NewPhoto): Promise<Saved> {
  const { sha256, mediaType } = facts;
  return recordEntry(
    db,
    buildId,
    'photo-taken',
    { target: { photoId }, value: { ...facts, bytes: bytes.byteLength } },
    {
      tables: [db.photos],
      write: async () => {
        if (await db.photos.get([buildId, sha256])) return;
        await db.photos.add({
          buildId,
          sha256,
          bytes,
          mediaType,
          length: bytes.byteLength,
          sync: 'held',
          addedAt: db.clock(),
        });
      },
    },
  );
}

export function captionPhoto(
  db: AccountDatabase,
  { buildId, photoId, caption }: { buildId: string; photoId: string; caption: string },
): Promise<Saved> {
  return recordEntry(db, buildId, 'photo-captioned', { target: { photoId }, value: { caption } });
}
