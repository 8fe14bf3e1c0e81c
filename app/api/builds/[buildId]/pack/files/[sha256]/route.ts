import { fileResponse } from '@/lib/server/files/file-response';
import { onBuild } from '@/lib/server/policies/on-build';
import { findPackFile } from '@/lib/server/queries/pack';
import { buildFileParams } from '@/lib/server/request/build-params';
import { route } from '@/lib/server/route';

/** A drawing or other attachment of a build's plan. */
export const GET = route(
  { auth: 'member', params: buildFileParams, policy: onBuild('take-to-bench') },
  async ({ params, request }) => fileResponse(request, await findPackFile(params.buildId, params.sha256)),
);
