import 'server-only';
import {
  DeleteObjectCommand,
  GetObjectCommand,
  HeadObjectCommand,
  NoSuchKey,
  NotFound,
  PutObjectCommand,
  S3Client,
} from '@aws-sdk/client-s3';
import type { FileStore } from './file-store';

export interface BucketSettings {
  bucket: string;
  region: string;
  endpoint?: string;
  accessKeyId?: string;
  secretAccessKey?: string;
}

/** Keeps bytes in a bucket that speaks the S3 protocol. */
export function bucketStore({ bucket, region, endpoint, accessKeyId, secretAccessKey }: BucketSettings): FileStore {
  const client = new S3Client({
    region,
    endpoint,
    forcePathStyle: true,
    // The SDK's default trailing checksums are not understood by every server of this protocol; hashes prove the bytes.
    requestChecksumCalculation: 'WHEN_REQUIRED',
    responseChecksumValidation: 'WHEN_REQUIRED',
    // A bucket that does not answer must not hold a phone's upload for ever: the phone tries again.
    requestHandler: { connectionTimeout: 5_000, requestTimeout: 60_000, throwOnRequestTimeout: true },
    credentials: accessKeyId && secretAccessKey ? { accessKeyId, secretAccessKey } : undefined,
  });
  const key = (fileId: string) => `files/${fileId}`;
  return {
    kind: 'bucket',
    put: async (fileId, content, mediaType) => {
      await client.send(
        new PutObjectCommand({ Bucket: bucket, Key: key(fileId), Body: content, ContentType: mediaType }),
      );
    },
    get: async (fileId) => {
      try {
        const { Body } = await client.send(new GetObjectCommand({ Bucket: bucket, Key: key(fileId) }));
        return Body ? Buffer.from(await Body.transformToByteArray()) : null;
      } catch (error) {
        if (error instanceof NoSuchKey) return null;
        throw error;
      }
    },
    has: async (fileId) => {
      try {
        await client.send(new HeadObjectCommand({ Bucket: bucket, Key: key(fileId) }));
        return true;
      } catch (error) {
        if (error instanceof NotFound) return false;
        throw error;
      }
    },
    remove: async (fileId) => {
      await client.send(new DeleteObjectCommand({ Bucket: bucket, Key: key(fileId) }));
    },
  };
}
