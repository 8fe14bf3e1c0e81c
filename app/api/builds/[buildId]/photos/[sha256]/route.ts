import { addPhoto } from '@/lib/server/commands/add-photo';
import { fileResponse } from '@/lib/server/files/file-response';
import { onBuild } from '@/lib/server/policies/on-build';
import { findPhotoFile } from '@/lib/server/queries/photo';
import { buildFileParams } from '@/lib/server/request/build-params';
import { route } from '@/lib/server/route';

/** Takes the bytes of a photo under the hash by which the phone names it; repeating it changes nothing. */
export const PUT = route(
  { auth: 'member', kind: 'bytes', params: buildFileParams, policy: onBuild('add-photo') },
  ({ account, params, bytes }) => addPhoto(params.buildId, account, params.sha256, bytes),
);

export const GET = route(
  { auth: 'member', params: buildFileParams, policy: onBuild('read-photo') },
  async ({ params, request }) => fileResponse(request, await findPhotoFile(params.buildId, params.sha256)),
);
