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

/** An answer whose connection is lost after its first bytes. */
function cutShort(): Response {
  const response = new Response('{"format":');
  return Object.defineProperty(response, 'arrayBuffer', {
    value: () => Promise.reject(new TypeError('network error')),
  });
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

  it('says that the signal went when an answer stops in its middle, and goes on from there', async () => {
    for (const from of ['/pack', '/plan', '/d']) {
      const stops = async (url: string) => (url.endsWith(from) ? cutShort() : answer(url));
      const result = await take(stops);
      expect(result, from).toMatchObject({ ok: false, code: 'no-signal' });
      expect(result.ok ? '' : result.message).toMatch(/^No signal/);
      expect(await planHere()).toBeUndefined();
    }
    expect(await take()).toMatchObject({ ok: true });
    expect(fetched).not.toContain('/api/plan');
  });

  it.each([
    ['in place of the list', '/pack', { redirected: false }],
    ['in place of a file', '/d', { redirected: false }],
    ['after leading elsewhere', '/plan', { redirected: true }],
  ])('takes a Wi-Fi sign-in page for no answer, %s, and keeps nothing of it', async (_, from, { redirected }) => {
    const ready = (await phone.db.builds.get(BUILD))!.packReadyAt;
    const page = () => {
      const response = new Response('<html>Welcome to the café</html>', {
        headers: { 'content-type': redirected ? 'text/plain' : 'text/html' },
      });
      return Object.defineProperty(response, 'redirected', { value: redirected });
    };
    const result = await take(async (url) => (url.endsWith(from) ? page() : answer(url)));
    expect(result).toMatchObject({ ok: false, code: 'no-signal' });
    expect(result.ok ? '' : result.message).toMatch(/Wi-Fi sign-in page/);
    for (const kept of cached.values()) expect(await kept.clone().text()).not.toContain('café');
    expect((await phone.db.builds.get(BUILD))!.packReadyAt).toBe(ready);
  });

  it('refuses a plan that this version cannot read, though it came whole', async () => {
    const plan = new TextEncoder().encode('{"format":"a later one"}');
    files.set('/api/plan', plan);
    Object.assign(manifest.files[0]!, { sha256: await sha256Hex(plan.buffer), bytes: plan.byteLength });
    const result = await take();
    expect(result).toMatchObject({ ok: false, code: 'broken' });
    expect(result.ok ? '' : result.message).toMatch(/cannot be read by this version.*Update it/);
    expect((await phone.db.builds.get(BUILD))!.name).toBe('Trestles');
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
