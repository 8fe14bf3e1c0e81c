import { onBuild } from '@/lib/server/policies/on-build';
import { presentBuild } from '@/lib/server/presenters/build';
import { buildParams } from '@/lib/server/request/build-params';
import { route } from '@/lib/server/route';

export const GET = route({ auth: 'member', params: buildParams, policy: onBuild('read') }, ({ account, params }) =>
  presentBuild(params.buildId, account.id, Date.now()),
);
