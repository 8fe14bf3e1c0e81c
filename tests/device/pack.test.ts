import { readFileSync } from 'node:fs';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { packFile, takeToBench, type PackProgress } from '@/lib/device/pack';
import { sha256Hex } from '@/lib/device/sha256';
import type { PackManifest } from '@/lib/domain/build/wire';
import { getPlan } from '@/lib/store/queries/builds';
import { FakeSyncServer } from '../fakes/sync-server';
import { ACCOUNT, BUILD, uuidOf } from '../support/log';
import { openPhone, type Phone } from '../support/phone';

const PLAN = readFileSync('plans/hall-bench.json');
const DRAWING = new TextEncoder().encode('a drawing');

let phone: Phone;
let manifest: PackManifest;
let files: Map<string, Uint8Array<ArrayBuffer>>;
let cached: Map<string, Response>;
beforeEach(async () => {
  phone = await openPhone(1, new FakeSyncServer());
  files = new Map([
    ['/api/plan', new Uint8Array(PLAN)],
    ['/api/builds/x/pack/files/d', DRAWING],
  ]);
  const entry = async (url: string, title: string, kind: 'plan' | 'drawing', mediaType: string) => ({
    title,
    kind,
    url,
    sha256: await sha256Hex(files.get(url)!.buffer),
    bytes: files.get(url)!.byteLength,
    mediaType,
  });
  const list = [
    await entry('/api/plan', 'The plan', 'plan', 'application/json'),
    await entry('/api/builds/x/pack/files/d', 'Front', 'drawing', 'image/png'),
  ];
  manifest = {
    format: 'holdfast-pack',
    version: 1,
    buildId: BUILD,
    buildName: 'Hall bench',
    accountId: ACCOUNT,
    role: 'owner',
    planRevisionId: uuidOf(0xf),
    contentHash: list[0]!.sha256,
    builtAt: 0,
    epoch: uuidOf(0xe),
    files: list,
    bytes: list.reduce((sum, { bytes }) => sum + bytes, 0),
    crew: [],
  };
  cached = new Map();
});
afterEach(() => phone.close());

const caches = {
  open: async () =>
    ({
      match: async (url: string) => cached.get(url)?.clone(),
      put: async (url: string, response: Response) => void cached.set(url, response),
    }) as unknown as Cache,
};

const fetched: string[] = [];
async function answer(url: string): Promise<Response> {
  fetched.push(url);
  if (url === `/api/builds/${BUILD}/pack`) return Response.json(manifest);
  const bytes = files.get(url);
  return bytes ? new Response(bytes) : new Response('', { status: 404 });
}

function take(fetch: (url: string) => Promise<Response> = answer, onProgress?: (progress: PackProgress) => void) {
  fetched.length = 0;
  return takeToBench({ db: phone.db, buildId: BUILD, fetch, caches, onProgress });
}

const planHere = () => getPlan(phone.db, manifest.contentHash);

describe('taking a build to the bench', () => {
  it('brings the plan and every file, tells how far it is, and says ready only at the end', async () => {
    const seen: PackProgress[] = [];
    expect(await take(answer, (progress) => seen.push(progress))).toMatchObject({ ok: true });
    expect(seen.map(({ doneBytes }) => doneBytes)).toEqual([0, PLAN.byteLength, manifest.bytes]);
    expect((await planHere())?.title).toBe('Hall bench with a lifting seat');
    expect(await phone.db.builds.get(BUILD)).toMatchObject({ packBytes: manifest.bytes, name: 'Hall bench' });
  });

  it('fetches a file again only when what lies here is not what it should be', async () => {
    await take();
    await take();
    expect(fetched).toEqual([`/api/builds/${BUILD}/pack`]);
    cached.set('/api/plan', new Response('{"half": '));
    await take();
    expect(fetched).toEqual([`/api/builds/${BUILD}/pack`, '/api/plan']);
  });

  it('leaves what was ready as it was when a file came changed', async () => {
    const ready = (await phone.db.builds.get(BUILD))!.packReadyAt;
    files.set('/api/builds/x/pack/files/d', new TextEncoder().encode('a drawinG'));
    const result = await take();
    expect(result).toMatchObject({ ok: false, code: 'broken', message: 'Front changed on its way here. Try again.' });
    expect((await phone.db.builds.get(BUILD))!.packReadyAt).toBe(ready);
    expect(await planHere()).toBeUndefined();
  });

  it('goes on where it was cut off', async () => {
    const cut = (url: string) => (url.endsWith('/d') ? Promise.reject(new TypeError('network')) : answer(url));
    expect(await take(cut)).toMatchObject({ ok: false, code: 'no-signal' });
    expect(await take()).toMatchObject({ ok: true });
    expect(fetched).not.toContain('/api/plan');
  });

  it('takes a Wi-Fi sign-in page for no answer', async () => {
    const page = async () => new Response('<html>Welcome to the café</html>', { status: 200 });
    const result = await take(page);
    expect(result).toMatchObject({ ok: false, code: 'no-signal' });
    expect(result.ok ? '' : result.message).toMatch(/Wi-Fi sign-in page/);
  });

  it.each([
    [401, 'sign-in'],
    [404, 'not-there'],
    [503, 'no-signal'],
  ] as const)('says in words what a %i means', async (status, code) => {
    expect(await take(async () => new Response('', { status }))).toMatchObject({ ok: false, code });
  });

  it('does not mix accounts: a pack of another one is refused', async () => {
    manifest.accountId = uuidOf(0xabc);
    expect(await take()).toMatchObject({ ok: false, code: 'other-account' });
  });

  it('says so when the phone is full', async () => {
    const full = {
      open: async () =>
        ({
          match: async () => undefined,
          put: async () => {
            throw new DOMException('full', 'QuotaExceededError');
          },
        }) as unknown as Cache,
    };
    const result = await takeToBench({ db: phone.db, buildId: BUILD, fetch: answer, caches: full });
    expect(result).toMatchObject({ ok: false, code: 'full' });
  });

  it('finds a file of the pack afterwards, and says when one is not here', async () => {
    const sha256 = manifest.files[1]!.sha256;
    cached.set(`/api/builds/${BUILD}/pack/files/${sha256}`, new Response(DRAWING));
    const found = await packFile(caches, { accountId: ACCOUNT, buildId: BUILD, sha256 });
    expect(await found?.text()).toBe('a drawing');
    expect(await packFile(caches, { accountId: ACCOUNT, buildId: BUILD, sha256: 'f'.repeat(64) })).toBeNull();
  });
});
