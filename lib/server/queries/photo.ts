import 'server-only';
import type { StoredFile } from '@/models/stored-file';
import { db } from '../db';

/** Stored file of a build's photo by the phone's hash, or null. */
export async function findPhotoFile(buildId: string, hash: string): Promise<StoredFile | null> {
  const photo = await db().models.Photo.findOne({ where: { buildId, sha256: hash } });
  return photo && db().models.StoredFile.findByPk(photo.fileId);
}
