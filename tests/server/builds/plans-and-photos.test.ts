import { createHash } from 'node:crypto';
import { readFileSync } from 'node:fs';
import sharp from 'sharp';
import { beforeEach, describe, expect, it } from 'vitest';
import { readPlan } from '@/lib/domain/plan/read-plan';
import type { Account } from '@/lib/server/auth/read-session';
import { addPhoto } from '@/lib/server/commands/add-photo';
import { exportPlan } from '@/lib/server/commands/export-plan';
import { importPlan } from '@/lib/server/commands/import-plan';
import { startBuild } from '@/lib/server/commands/start-build';
import { readFile } from '@/lib/server/files/store-file';
import { findPackFile, readPackManifest, readPackPlan } from '@/lib/server/queries/pack';
import { findPhotoFile } from '@/lib/server/queries/photo';
import { listPlans } from '@/lib/server/queries/plans';
import { makeAccount } from '../../support/accounts';
import { useDatabase } from '../../support/database';

useDatabase();
const sha256 = (bytes: Uint8Array) => createHash('sha256').update(bytes).digest('hex');
const file = readFileSync('plans/hall-bench.json', 'utf8');

let author: Account;
beforeEach(async () => {
  author = await makeAccount();
});

describe('plans in and out', () => {
  it('the same file gives the same revision, a changed one the next', async () => {
    const first = await importPlan(author, file);
    expect(first).toMatchObject({ number: 1, isNew: true });
    expect(await importPlan(author, file)).toEqual({ ...first, isNew: false });
    const changed = file.replace('A bench to put your shoes on', 'A bench for boots');
    expect(await importPlan(author, changed)).toMatchObject({ planId: first.planId, number: 2, isNew: true });
  });

  it('what was exported imports to the same content, drawings and all', async () => {
    const first = await importPlan(author, file);
    const { text, fileName } = await exportPlan(author, first.planId);
    expect(fileName).toBe('hall-bench.json');
    expect((JSON.parse(text) as { attachments: unknown }).attachments).toEqual(
      (JSON.parse(file) as { attachments: unknown }).attachments,
    );
    expect((await importPlan(author, text)).contentHash).toBe(first.contentHash);
  });

  it('a drawing whose bytes are not what they say is refused by its path', async () => {
    const plan = JSON.parse(file) as { attachments: { content: string }[] };
    plan.attachments[0]!.content = Buffer.from('not a drawing').toString('base64');
    await expect(importPlan(author, plan)).rejects.toMatchObject({
      code: 'invalid',
      extra: { problems: [{ path: 'attachments[0].content' }] },
    });
  });

  it('a slip in the file is named by line and column', () => {
    const read = readPlan('{\n  "format": "holdfast-plan",\n  "version" 1\n}');
    expect(read.ok ? '' : read.problems[0]!.message).toContain('line 3, column 13');
  });

  it('another’s private plan is neither listed nor built', async () => {
    const { planId } = await importPlan(author, file);
    const other = await makeAccount();
    expect(await listPlans(other.id)).toEqual([]);
    await expect(startBuild(other, planId, 'Mine')).rejects.toMatchObject({ code: 'not-found' });
    await expect(exportPlan(other, planId)).rejects.toMatchObject({ code: 'not-found' });
  });
});

describe('the bench pack', () => {
  it('every file that it names is there with the hash that it names', async () => {
    const { planId } = await importPlan(author, file);
    const { buildId } = await startBuild(author, planId, 'Bench');
    const manifest = await readPackManifest(buildId, author.id, 'owner', 0);
    expect(manifest!.files).toHaveLength(2);
    for (const { kind, sha256: hash, bytes } of manifest!.files) {
      const stored = kind === 'plan' ? null : await findPackFile(buildId, hash);
      const content = stored
        ? await readFile(stored)
        : Buffer.from((await readPackPlan(buildId, manifest!.contentHash))!);
      expect(sha256(content!)).toBe(hash);
      expect(content!.byteLength).toBe(bytes);
    }
    expect(await findPackFile(buildId, 'f'.repeat(64))).toBeNull();
  });
});

describe('photos', () => {
  let buildId: string;
  beforeEach(async () => {
    const { planId } = await importPlan(author, file);
    ({ buildId } = await startBuild(author, planId, 'Bench'));
  });

  it('are kept upright and without metadata, under the hash of the phone, once', async () => {
    const bytes = await sharp({ create: { width: 60, height: 40, channels: 3, background: '#884422' } })
      .jpeg()
      .withExif({ IFD0: { Make: 'Camera of a phone' }, IFD3: { GPSLatitudeRef: 'N', GPSLatitude: '51/1 30/1 0/1' } })
      .withMetadata({ orientation: 6 })
      .toBuffer();
    expect(bytes.includes('Camera of a phone')).toBe(true);
    const answer = await addPhoto(buildId, author, sha256(bytes), bytes);
    expect(answer).toEqual({ format: 'holdfast-photo', sha256: sha256(bytes), bytes: bytes.byteLength, stored: true });
    expect(await addPhoto(buildId, author, sha256(bytes), bytes)).toEqual(answer);
    const stored = (await findPhotoFile(buildId, sha256(bytes)))!;
    expect([stored.width, stored.height]).toEqual([40, 60]);
    const kept = (await readFile(stored))!;
    expect((await sharp(kept).metadata()).exif).toBeUndefined();
    expect(kept.includes('Camera of a phone')).toBe(false);
  });

  it.each([
    ['a text named .jpg', Buffer.from('hello, I am a photo'), 'wrong-type'],
    ['a HEIC picture', Buffer.from('0000001866747970686569630000000000000000', 'hex'), 'wrong-type'],
    ['a JPEG cut short', Buffer.from('ffd8ffe000104a46494600010100', 'hex'), 'wrong-type'],
  ])('%s is refused in words', async (_name, bytes, code) => {
    await expect(addPhoto(buildId, author, sha256(bytes), bytes)).rejects.toMatchObject({ code });
  });

  it('a photo that changed on its way is refused', async () => {
    await expect(addPhoto(buildId, author, 'a'.repeat(64), Buffer.from('x'))).rejects.toMatchObject({
      code: 'conflict',
    });
  });
});
