import { createHash } from 'node:crypto';
import { readdirSync } from 'node:fs';
import path from 'node:path';
import { pathToFileURL } from 'node:url';
import sharp from 'sharp';
import { v7 } from 'uuid';
import { beforeAll, describe, expect, it } from 'vitest';
import { addPhoto } from '@/lib/server/commands/add-photo';
import { makeAccount, signedIn } from '../../support/accounts';
import { joinCrew, startedBuild } from '../../support/builders';
import { useDatabase } from '../../support/database';
import { demoPlan } from '../../support/plans';
import { ownRequest, routeContext } from '../../support/request';

useDatabase();

const ROLES = ['nobody', 'stranger', 'removed', 'onlooker', 'helper', 'owner'] as const;
type Role = (typeof ROLES)[number];
type Handler = (request: Request, context: unknown) => Promise<Response>;

const api = path.resolve('app/api');
const handlers = new Map<string, Handler>();
const cookies = {} as Record<Role, string>;
const accounts = {} as Record<Exclude<Role, 'nobody'>, string>;
const params: Record<string, string> = {};
let photo: Uint8Array<ArrayBuffer>;

beforeAll(async () => {
  for (const room of ['builds', 'plans', 'me', 'health']) {
    const files = readdirSync(path.join(api, room), { recursive: true, encoding: 'utf8' });
    for (const file of files.filter((name) => name.endsWith('route.ts'))) {
      const exports = (await import(pathToFileURL(path.join(api, room, file)).href)) as Record<string, Handler>;
      const at = `/api/${path.join(room, path.dirname(file))}`;
      for (const [method, handle] of Object.entries(exports)) handlers.set(`${method} ${at}`, handle);
    }
  }
  const { owner, buildId, planId, contentHash } = await startedBuild();
  const people = { owner, helper: await makeAccount(), onlooker: await makeAccount(), removed: await makeAccount() };
  await joinCrew(buildId, people.helper, 'helper');
  await joinCrew(buildId, people.onlooker, 'onlooker');
  await (await joinCrew(buildId, people.removed, 'helper')).update({ removedAt: new Date() });
  for (const [role, { id }] of Object.entries({ ...people, stranger: await makeAccount() })) {
    accounts[role as 'owner'] = id;
    cookies[role as Role] = (await signedIn(id)).cookie;
  }
  const made = await sharp({ create: { width: 8, height: 8, channels: 3, background: '#123456' } })
    .jpeg()
    .toBuffer();
  photo = new Uint8Array(made);
  const sha256 = createHash('sha256').update(photo).digest('hex');
  await addPhoto(buildId, owner, sha256, photo);
  Object.assign(params, { buildId, planId, contentHash, photo: sha256 });
  params.drawing = demoPlan('folding-trestles').attachments[0]!.sha256;
});

interface Walk {
  at: string;
  /** Which of the params is the hash in the address. */
  sha256?: 'photo' | 'drawing';
  body?: (role: Role) => unknown;
  bytes?: () => Uint8Array<ArrayBuffer>;
  /** Status for each of {@link ROLES}, in their order. */
  answers: [number, number, number, number, number, number];
}

const crewOnly: Walk['answers'] = [401, 404, 404, 200, 200, 200];
const members: Walk['answers'] = [401, 200, 200, 200, 200, 200];
const walks: Walk[] = [
  { at: 'GET /api/health', answers: [200, 200, 200, 200, 200, 200] },
  { at: 'GET /api/me', answers: members },
  { at: 'GET /api/plans', answers: members },
  {
    at: 'POST /api/plans/import',
    body: () => demoPlan('folding-trestles'),
    answers: [401, 200, 200, 200, 200, 200],
  },
  { at: 'GET /api/plans/[planId]/export', answers: [401, 404, 404, 404, 404, 200] },
  { at: 'GET /api/builds', answers: members },
  {
    at: 'POST /api/builds',
    body: () => ({ planId: params.planId, name: 'Mine' }),
    answers: [401, 404, 404, 404, 404, 200],
  },
  { at: 'GET /api/builds/[buildId]', answers: crewOnly },
  { at: 'GET /api/builds/[buildId]/log', answers: crewOnly },
  {
    at: 'POST /api/builds/[buildId]/log',
    body: (role) => ({
      deviceId: v7(),
      accountId: role === 'nobody' ? v7() : accounts[role],
      cursor: 0,
      sentAt: Date.now(),
      entries: [],
    }),
    // A removed member is answered, entry by entry, and reads nothing.
    answers: [401, 404, 200, 200, 200, 200],
  },
  { at: 'GET /api/builds/[buildId]/pack', answers: crewOnly },
  { at: 'GET /api/builds/[buildId]/pack/plan/[contentHash]', answers: crewOnly },
  { at: 'GET /api/builds/[buildId]/pack/files/[sha256]', sha256: 'drawing', answers: crewOnly },
  { at: 'GET /api/builds/[buildId]/photos/[sha256]', sha256: 'photo', answers: crewOnly },
  {
    at: 'PUT /api/builds/[buildId]/photos/[sha256]',
    sha256: 'photo',
    bytes: () => photo,
    answers: [401, 404, 404, 403, 200, 200],
  },
];

describe('every route of plans and builds', () => {
  it('is walked', () => {
    expect(walks.map(({ at }) => at).sort()).toEqual([...handlers.keys()].sort());
  });

  it.each(walks)('$at answers each role as it may', async ({ at, sha256, body, bytes, answers }) => {
    const [method = '', address = ''] = at.split(' ');
    const got: Partial<Record<Role, number>> = {};
    for (const role of ROLES) {
      const own = ownRequest(address, {
        method,
        body: body?.(role),
        cookie: cookies[role],
        headers: bytes && { 'content-type': 'image/jpeg' },
      });
      const request = bytes ? new Request(own, { body: bytes() }) : own;
      const given = { ...params, ...(sha256 && { sha256: params[sha256]! }) };
      const response = await handlers.get(at)!(request, routeContext(given));
      got[role] = response.status;
      expect(response.headers.get('x-content-type-options') ?? 'nosniff').toBe('nosniff');
      if (response.status >= 400) {
        expect(response.headers.get('content-type')).toBe('application/problem+json');
        expect(response.headers.get('cache-control')).toBe('no-store');
      }
    }
    expect(got).toEqual(Object.fromEntries(ROLES.map((role, i) => [role, answers[i]])));
  });
});
