import { AppError } from '@/lib/server/errors';
import { keptResponse } from '@/lib/server/files/kept-response';
import { onBuild } from '@/lib/server/policies/on-build';
import { readPackPlan } from '@/lib/server/queries/pack';
import { buildPlanParams } from '@/lib/server/request/build-params';
import { route } from '@/lib/server/route';

/** The plan document of a build, named by its content hash. */
export const GET = route(
  { auth: 'member', params: buildPlanParams, policy: onBuild('take-to-bench') },
  ({ params, request }) =>
    keptResponse(request, params.contentHash, { 'content-type': 'application/json' }, async () => {
      const text = await readPackPlan(params.buildId, params.contentHash);
      if (text === null)
        throw new AppError('not-found', 'This build now follows another revision. Take it to the bench again.');
      return text;
    }),
);
