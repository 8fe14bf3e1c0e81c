import 'server-only';
import type { Account } from '../auth/read-session';
import { db } from '../db';
import { AppError } from '../errors';
import { sha256, storeFile } from '../files/store-file';
import { cleanPhoto } from '../photos/clean-photo';

export interface PhotoAnswer {
  format: 'holdfast-photo';
  sha256: string;
  bytes: number;
  stored: true;
}

/**
 * Keeps a photo of a build under the hash by which the phone names it. Sending it again changes nothing. What is stored
 * is written anew without metadata, so its own hash differs.
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
    throw new AppError(
      'conflict',
      'The photo changed on its way here. It is safe on the phone and will be sent again.',
    );
  }
  if (await Photo.findOne({ where: { buildId, sha256: hash } })) return answer;
  const { content, ...facts } = await cleanPhoto(bytes);
  const file = await storeFile(content, facts);
  await Photo.findOrCreate({
    where: { buildId, sha256: hash },
    defaults: { buildId, sha256: hash, fileId: file.id, accountId: account.id },
  });
  return answer;
}
