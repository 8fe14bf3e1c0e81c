import 'server-only';
import type { Account } from '../auth/read-session';
import { roleOnBuild } from '../queries/crew';
import { mayOnBuild, type BuildAct } from './build';
import type { Verdict } from './verdict';

/** Policy of a route about one build: the person's role in its crew at this moment decides. */
export function onBuild(act: BuildAct) {
  return async ({ account, params }: { account: Account; params: { buildId: string } }): Promise<Verdict> =>
    mayOnBuild(act, await roleOnBuild(params.buildId, account.id));
}
