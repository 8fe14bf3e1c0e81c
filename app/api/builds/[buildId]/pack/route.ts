import { AppError } from '@/lib/server/errors';
import { onBuild } from '@/lib/server/policies/on-build';
import { roleOnBuild } from '@/lib/server/queries/crew';
import { readPackManifest } from '@/lib/server/queries/pack';
import { buildParams } from '@/lib/server/request/build-params';
import { route } from '@/lib/server/route';

/** What the bench pack of a build holds. */
export const GET = route(
  { auth: 'member', params: buildParams, policy: onBuild('take-to-bench') },
  async ({ account, params }) => {
    const role = await roleOnBuild(params.buildId, account.id);
    const manifest = role && (await readPackManifest(params.buildId, account.id, role, Date.now()));
    if (!manifest) throw new AppError('not-found', 'There is no such build, or you are not of its crew.');
    return manifest;
  },
);
