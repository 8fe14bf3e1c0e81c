import { startBuildSchema } from '@/lib/domain/build/start-build-schema';
import { startBuild } from '@/lib/server/commands/start-build';
import { listBuilds } from '@/lib/server/queries/builds';
import { route } from '@/lib/server/route';

export const GET = route({ auth: 'member' }, async ({ account }) => ({
  builds: await listBuilds(account.id),
}));

export const POST = route({ auth: 'member', body: startBuildSchema }, ({ account, body }) =>
  startBuild(account, body.planId, body.name),
);
