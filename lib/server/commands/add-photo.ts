import 'server-only';
import type { Account } from '../auth/read-session';
import { db } from '../db';
import { AppError } from '../errors';
import { isKept, sha256, storeFile } from '../files/store-file';
import { cleanPhoto } from '../photos/clean-photo';
import { findPhotoFile } from '../queries/photo';

export interface PhotoAnswer {
  format: 'holdfast-photo';
  sha256: string;
  bytes: number;
  stored: true;
}

/**
 * Keeps a photo of a build under the hash by which the phone names it. Sending it again changes nothing, but
 * mends a store that has lost the bytes. What is stored is written anew without metadata, so its own hash differs.
 *
 * @throws AppError `conflict` when the bytes are not those of the hash, and what {@link cleanPhoto} throws
 */
export async function addPhoto(
  buildId: string,
  account: Account,
  hash: string,
  bytes: Uint8Array,
): Promise<PhotoAnswer> {
  const { Photo } = db().models;
  const answer: PhotoAnswer = { format: 'holdfast-photo', sha256: hash, bytes: bytes.byteLength, stored: true };
  if (sha256(bytes) !== hash) {
    throw new AppError('conflict', 'What arrived is not the photo that was named. It is kept on the phone.');
  }
  const before = await findPhotoFile(buildId, hash);
  if (before && (await isKept(before))) return answer;
  const { content, ...facts } = await cleanPhoto(bytes);
  const file = await storeFile(content, facts);
  const [photo] = await Photo.findOrCreate({
    where: { buildId, sha256: hash },
    defaults: { buildId, sha256: hash, fileId: file.id, accountId: account.id },
  });
  if (photo.fileId !== file.id) await photo.update({ fileId: file.id });
  return answer;
}
