import { createHash } from 'node:crypto';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import S3rver from 's3rver';
import { v7 } from 'uuid';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { bucketStore } from '@/lib/server/files/bucket-store';
import { databaseStore } from '@/lib/server/files/database-store';
import type { FileStore } from '@/lib/server/files/file-store';
import { useDatabase } from '../../support/database';

const database = useDatabase();
const sha256 = (bytes: Uint8Array) => createHash('sha256').update(bytes).digest('hex');
const folder = mkdtempSync(path.join(tmpdir(), 'holdfast-bucket-'));
const fake = new S3rver({
  address: '127.0.0.1',
  port: 0,
  silent: true,
  directory: folder,
  configureBuckets: [{ name: 'holdfast', configs: [] }],
});
let endpoint = '';

beforeAll(async () => {
  const { port } = await fake.run();
  endpoint = `http://127.0.0.1:${port}`;
});
afterAll(async () => {
  await fake.close();
  rmSync(folder, { recursive: true, force: true });
});

const stores: Record<FileStore['kind'], () => FileStore> = {
  database: () => databaseStore(database().models),
  bucket: () =>
    bucketStore({
      bucket: 'holdfast',
      region: 'us-east-1',
      endpoint,
      accessKeyId: 'S3RVER',
      secretAccessKey: 'S3RVER',
    }),
};

/** The database's store keeps bytes of a row that is there; the bucket does not mind. */
async function newFile(bytes: Uint8Array): Promise<string> {
  const row = await database().models.StoredFile.create({
    sha256: sha256(Buffer.concat([bytes, Buffer.from(v7())])),
    bytes: bytes.length,
    mediaType: 'image/png',
    storage: 'database',
  });
  return row.id;
}

describe.each(['database', 'bucket'] as const)('bytes in the %s', (kind) => {
  it('come back as they were', async () => {
    const bytes = Buffer.from(Array.from({ length: 300_000 }, (_, i) => (i * 31) % 256));
    const id = await newFile(bytes);
    await stores[kind]().put(id, bytes, 'image/png');
    expect(sha256((await stores[kind]().get(id))!)).toBe(sha256(bytes));
  });

  it('put twice are there once, unchanged', async () => {
    const id = await newFile(Buffer.from('once'));
    await stores[kind]().put(id, Buffer.from('once'), 'image/png');
    await stores[kind]().put(id, Buffer.from('once'), 'image/png');
    expect((await stores[kind]().get(id))!.toString()).toBe('once');
  });

  it('that are not there are none, even under a name that is nearly theirs', async () => {
    const id = await newFile(Buffer.from('near'));
    await stores[kind]().put(id, Buffer.from('near'), 'image/png');
    const near = `${id.slice(0, -1)}${id.endsWith('0') ? '1' : '0'}`;
    expect(await stores[kind]().get(near)).toBeNull();
    expect(await stores[kind]().has(near)).toBe(false);
    expect(await stores[kind]().has(id)).toBe(true);
  });

  it('that were removed are gone', async () => {
    const id = await newFile(Buffer.from('gone'));
    await stores[kind]().put(id, Buffer.from('gone'), 'image/png');
    await stores[kind]().remove(id);
    expect(await stores[kind]().get(id)).toBeNull();
  });
});
