import 'server-only';
import { createHash } from 'node:crypto';
import type { StoredFile } from '@/models/stored-file';
import { db } from '../db';
import { env } from '../env';
import { bucketStore } from './bucket-store';
import { databaseStore } from './database-store';
import type { FileStore } from './file-store';

let bucket: FileStore | undefined;

/** The store of a kind; the bucket's only where one is configured. */
function storeOf(kind: FileStore['kind']): FileStore {
  return kind === 'bucket' ? (bucket ??= openBucket()) : databaseStore(db().models);
}

function openBucket(): FileStore {
  const { S3_BUCKET, S3_REGION, S3_ENDPOINT, S3_ACCESS_KEY_ID, S3_SECRET_ACCESS_KEY } = env();
  if (!S3_BUCKET) throw new Error('A file is in a bucket, and S3_BUCKET is not set.');
  return bucketStore({
    bucket: S3_BUCKET,
    region: S3_REGION,
    endpoint: S3_ENDPOINT,
    accessKeyId: S3_ACCESS_KEY_ID,
    secretAccessKey: S3_SECRET_ACCESS_KEY,
  });
}

export const sha256 = (content: Uint8Array): string => createHash('sha256').update(content).digest('hex');

/**
 * Keeps bytes once, whoever brings them: the same content has one row, in the store that was chosen when it first came.
 * The row is first, since it names the bytes; where those are missing, the same content puts them there.
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

/**
 * Bytes of a stored file.
 *
 * @throws Error where the store has lost them
 */
export async function readFile(row: StoredFile): Promise<Buffer> {
  const content = await storeOf(row.storage).get(row.id);
  if (!content) throw new Error(`the bytes of file ${row.id} are gone from its store, the ${row.storage}`);
  return content;
}

/** Whether the store still has the bytes of a file. */
export function isKept(row: StoredFile): Promise<boolean> {
  return storeOf(row.storage).has(row.id);
}
