import { createHash } from 'node:crypto';
import { readFileSync } from 'node:fs';
import { expect, it } from 'vitest';
import * as filesRoute from '@/app/api/builds/[buildId]/pack/files/[sha256]/route';
import * as packRoute from '@/app/api/builds/[buildId]/pack/route';
import * as planRoute from '@/app/api/builds/[buildId]/pack/plan/[contentHash]/route';
import { packManifestSchema } from '@/lib/domain/build/wire';
import { readPlan } from '@/lib/domain/plan/read-plan';
import { importPlan } from '@/lib/server/commands/import-plan';
import { startBuild } from '@/lib/server/commands/start-build';
import { makeAccount, signedIn } from '../../support/accounts';
import { useDatabase } from '../../support/database';
import { ownRequest, routeContext } from '../../support/request';

useDatabase();
const file = readFileSync('plans/hall-bench.json', 'utf8');

async function aBuild() {
  const owner = await makeAccount();
  const { cookie } = await signedIn(owner.id);
  const { planId } = await importPlan(owner, file);
  const { buildId } = await startBuild(owner, planId, 'Bench');
  const ask = async (address: string) => {
    const hash = address.split('/').at(-1)!;
    const handler = address.includes('/files/') ? filesRoute : address.includes('/plan/') ? planRoute : packRoute;
    return handler.GET(
      ownRequest(address, { cookie }),
      routeContext({ buildId, sha256: hash, contentHash: hash }) as never,
    );
  };
  const manifest = packManifestSchema.parse(await (await ask(`/api/builds/${buildId}/pack`)).json());
  return { owner, planId, buildId, manifest, ask };
}

it('every file that the manifest names is there, at its address, with its hash and size', async () => {
  const { manifest, ask } = await aBuild();
  expect(manifest.files).toHaveLength(2);
  for (const { url, sha256, bytes, mediaType } of manifest.files) {
    const response = await ask(url);
    expect(response.headers.get('content-type')).toBe(mediaType);
    const content = Buffer.from(await response.arrayBuffer());
    expect(createHash('sha256').update(content).digest('hex')).toBe(sha256);
    expect(content.byteLength).toBe(bytes);
  }
  expect(manifest.bytes).toBe(manifest.files.reduce((sum, { bytes }) => sum + bytes, 0));
});

it('the plan in it can be read, and its own hash is that of the revision', async () => {
  const { manifest, ask } = await aBuild();
  const plan = manifest.files.find(({ kind }) => kind === 'plan')!;
  expect(plan.sha256).toBe(manifest.contentHash);
  expect(readPlan(await (await ask(plan.url)).text())).toMatchObject({ ok: true });
});

it('stays with the revision that the build began with, when the plan is revised', async () => {
  const { owner, planId, buildId, manifest, ask } = await aBuild();
  const revised = await importPlan(owner, file.replace('A bench to put your shoes on', 'A bench for boots'));
  expect(revised).toMatchObject({ planId, number: 2 });
  const again = packManifestSchema.parse(await (await ask(`/api/builds/${buildId}/pack`)).json());
  expect(again.contentHash).toBe(manifest.contentHash);
  expect((await ask(`/api/builds/${buildId}/pack/plan/${revised.contentHash}`)).status).toBe(404);
});

it('a file of another plan is not to be had through it', async () => {
  const { buildId, ask } = await aBuild();
  expect((await ask(`/api/builds/${buildId}/pack/files/${'f'.repeat(64)}`)).status).toBe(404);
});
