import { createHash, randomBytes } from 'node:crypto';
import sharp from 'sharp';
import { beforeEach, describe, expect, it } from 'vitest';
import * as route from '@/app/api/builds/[buildId]/photos/[sha256]/route';
import { photoAnswerSchema } from '@/lib/domain/build/wire';
import type { Account } from '@/lib/server/auth/read-session';
import { isKept, readFile } from '@/lib/server/files/store-file';
import { findPhotoFile } from '@/lib/server/queries/photo';
import { makeAccount, signedIn } from '../../support/accounts';
import { joinCrew, startedBuild } from '../../support/builders';
import { useDatabase } from '../../support/database';
import { ownRequest, routeContext } from '../../support/request';

const database = useDatabase();
type Bytes = Uint8Array<ArrayBuffer>;
const sha256 = (bytes: Uint8Array) => createHash('sha256').update(bytes).digest('hex');

let buildId: string;
let cookie: string;
let owner: Account;
beforeEach(async () => {
  ({ buildId, owner } = await startedBuild());
  ({ cookie } = await signedIn(owner.id));
});

async function send(body: BodyInit, hash: string, headers: Record<string, string> = {}) {
  const own = ownRequest(`/api/builds/${buildId}/photos/${hash}`, {
    method: 'PUT',
    cookie,
    headers: { 'content-type': 'image/jpeg', ...headers },
  });
  const request = new Request(own, { body, duplex: 'half' } as RequestInit);
  const response = await route.PUT(request, routeContext({ buildId, sha256: hash }));
  return { status: response.status, body: (await response.json()) as { code?: string; detail?: string } };
}

const look = (hash: string, as = cookie, headers: Record<string, string> = {}) =>
  route.GET(
    ownRequest(`/api/builds/${buildId}/photos/${hash}`, { cookie: as, headers }),
    routeContext({ buildId, sha256: hash }),
  );

/** A picture of its own, 60 × 40, as a phone makes it: with its maker, a position, and held on its side. */
async function fromAPhone(format: 'jpeg' | 'png' | 'webp' = 'jpeg'): Promise<Bytes> {
  const [r = 0, g = 0, b = 0] = randomBytes(3);
  const made = await sharp({ create: { width: 60, height: 40, channels: 3, background: { r, g, b } } })
    .toFormat(format)
    .withExif({ IFD0: { Make: 'Camera of a phone' }, IFD3: { GPSLatitudeRef: 'N', GPSLatitude: '51/1 30/1 0/1' } })
    .withMetadata({ orientation: 6 })
    .toBuffer();
  return new Uint8Array(made);
}

describe('a photo from a phone', () => {
  it.each(['jpeg', 'png', 'webp'] as const)('as %s is kept upright, as JPEG, without any metadata', async (format) => {
    const bytes = await fromAPhone(format);
    expect(Buffer.from(bytes).includes('Camera of a phone')).toBe(true);
    const answer = await send(bytes, sha256(bytes), { 'content-type': `image/${format}` });
    expect(photoAnswerSchema.parse(answer.body)).toMatchObject({ sha256: sha256(bytes), bytes: bytes.byteLength });
    const stored = (await findPhotoFile(buildId, sha256(bytes)))!;
    expect([stored.mediaType, stored.width, stored.height]).toEqual(['image/jpeg', 40, 60]);
    const kept = await readFile(stored);
    expect(await sharp(kept).metadata()).toMatchObject({ format: 'jpeg', width: 40, height: 60 });
    for (const trace of ['exif', 'xmp', 'iptc', 'orientation'] as const) {
      expect((await sharp(kept).metadata())[trace], trace).toBeUndefined();
    }
    expect(kept.includes('Camera of a phone')).toBe(false);
  });

  it('sent twice, and twice at once, is there once', async () => {
    const bytes = await fromAPhone();
    const answers = await Promise.all([send(bytes, sha256(bytes)), send(bytes, sha256(bytes))]);
    answers.push(await send(bytes, sha256(bytes)));
    expect(new Set(answers.map(({ status }) => status))).toEqual(new Set([200]));
    expect(await database().models.Photo.count({ where: { buildId } })).toBe(1);
  });

  it('S9: sent again mends a store that lost it; the answer never says stored of what is not', async () => {
    const bytes = await fromAPhone();
    await send(bytes, sha256(bytes));
    const stored = (await findPhotoFile(buildId, sha256(bytes)))!;
    await database().models.FileBytes.destroy({ where: { fileId: stored.id } });
    expect((await look(sha256(bytes))).status).toBe(500);
    await send(bytes, sha256(bytes));
    expect(await isKept(stored)).toBe(true);
    expect((await look(sha256(bytes))).status).toBe(200);
  });
});

describe('what is no photo', () => {
  const text = new TextEncoder().encode('hello, I am a photo');
  const hex = (digits: string) => new Uint8Array(Buffer.from(digits, 'hex'));
  it.each<[string, Bytes, RegExp]>([
    ['a text named .jpg', text, /not a photo/],
    ['a HEIC picture', hex('0000001866747970686569630000000000000000'), /HEIC/],
    ['a JPEG cut short', hex('ffd8ffe000104a46494600010100'), /damaged/],
    ['a drawing that could run', new TextEncoder().encode('<svg xmlns="http://www.w3.org/2000/svg"/>'), /not a photo/],
    ['nothing', new Uint8Array(), /not a photo/],
  ])('%s is refused in words', async (_name, bytes, words) => {
    const answer = await send(bytes, sha256(bytes));
    expect(answer).toMatchObject({ status: 415, body: { code: 'wrong-type' } });
    expect(answer.body.detail).toMatch(words);
    expect(await database().models.Photo.count({ where: { buildId } })).toBe(0);
  });

  it('other bytes than those that were named are refused', async () => {
    expect(await send(await fromAPhone(), 'a'.repeat(64))).toMatchObject({ status: 409, body: { code: 'conflict' } });
  });

  it('more than 60 million points are refused, however few bytes they take', async () => {
    const wide = await sharp({ create: { width: 8_000, height: 8_000, channels: 3, background: '#fff' } })
      .png()
      .toBuffer();
    const bytes = new Uint8Array(wide);
    expect(await send(bytes, sha256(bytes))).toMatchObject({ status: 413, body: { code: 'too-large' } });
  });

  it('50 MB are refused by their announced length, without a byte being read', async () => {
    let read = 0;
    const body = new ReadableStream({ pull: () => void (read += 1) }, { highWaterMark: 0 });
    const answer = await send(body, 'a'.repeat(64), { 'content-length': '50000000' });
    expect(answer).toMatchObject({ status: 413, body: { code: 'too-large' } });
    expect(answer.body.detail).toContain('20 MB');
    expect(read).toBe(0);
  });

  it('a stream that goes on and on is cut off at 20 MB', async () => {
    const chunk = new Uint8Array(1_000_000);
    let sent = 0;
    const body = new ReadableStream({
      pull: (controller) => {
        sent += 1;
        controller.enqueue(chunk);
      },
    });
    expect(await send(body, 'a'.repeat(64))).toMatchObject({ status: 413 });
    expect(sent).toBeLessThan(24);
  });
});

describe('looking at a photo', () => {
  it('gives a picture that is shown and never run, kept by the browser and asked for each time', async () => {
    const bytes = await fromAPhone();
    await send(bytes, sha256(bytes));
    const first = await look(sha256(bytes));
    expect(Object.fromEntries(first.headers)).toMatchObject({
      'content-type': 'image/jpeg',
      'content-disposition': 'inline',
      'x-content-type-options': 'nosniff',
      'cache-control': 'private, no-cache',
      'content-security-policy': "default-src 'none'; sandbox",
    });
    const again = await look(sha256(bytes), cookie, { 'if-none-match': first.headers.get('etag')! });
    expect(again.status).toBe(304);
    expect(await again.text()).toBe('');
  });

  it('ends with the membership, whatever the browser kept', async () => {
    const bytes = await fromAPhone();
    await send(bytes, sha256(bytes));
    const helper = await makeAccount();
    const member = await joinCrew(buildId, helper, 'helper');
    const { cookie: theirs } = await signedIn(helper.id);
    const seen = await look(sha256(bytes), theirs);
    expect(seen.status).toBe(200);
    await member.update({ removedAt: new Date() });
    const kept = { 'if-none-match': seen.headers.get('etag')! };
    expect((await look(sha256(bytes), theirs, kept)).status).toBe(404);
  });
});
