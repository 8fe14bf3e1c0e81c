import 'server-only';
import { createHash } from 'node:crypto';
import type { StoredFile } from '@/models/stored-file';
import { db } from '../db';
import { env } from '../env';
import { bucketStore } from './bucket-store';
import { databaseStore } from './database-store';
import type { FileStore } from './file-store';

const stores = new Map<FileStore['kind'], FileStore>();

/** The store of a kind; the bucket's only where one is configured. */
export function storeOf(kind: FileStore['kind']): FileStore {
  const known = stores.get(kind);
  if (known) return known;
  const { S3_BUCKET, S3_REGION, S3_ENDPOINT, S3_ACCESS_KEY_ID, S3_SECRET_ACCESS_KEY } = env();
  if (kind === 'bucket' && !S3_BUCKET) throw new Error('A file is in a bucket, and S3_BUCKET is not set.');
  const store =
    kind === 'bucket'
      ? bucketStore({
          bucket: S3_BUCKET!,
          region: S3_REGION,
          endpoint: S3_ENDPOINT,
          accessKeyId: S3_ACCESS_KEY_ID,
          secretAccessKey: S3_SECRET_ACCESS_KEY,
        })
      : { ...databaseStore(db().models) };
  if (kind === 'bucket') stores.set(kind, store);
  return store;
}

export const sha256 = (content: Uint8Array): string => createHash('sha256').update(content).digest('hex');

/**
 * Keeps bytes once, whoever brings them: the same content has one row. Bytes are kept before the row says so, and a row
 * whose bytes are missing gets them again.
 */
export async function storeFile(
  content: Uint8Array,
  facts: { mediaType: string; width?: number | null; height?: number | null },
): Promise<StoredFile> {
  const { StoredFile } = db().models;
  const hash = sha256(content);
  const kind = env().S3_BUCKET ? 'bucket' : 'database';
  const [row] = await StoredFile.findOrCreate({
    where: { sha256: hash },
    defaults: {
      sha256: hash,
      bytes: content.byteLength,
      mediaType: facts.mediaType,
      width: facts.width ?? null,
      height: facts.height ?? null,
      storage: kind,
    },
  });
  await storeOf(row.storage).put(row.id, content, facts.mediaType);
  return row;
}

/** Bytes of a stored file; null where the store has lost them. */
export async function readFile(row: StoredFile): Promise<Buffer | null> {
  return storeOf(row.storage).get(row.id);
}
