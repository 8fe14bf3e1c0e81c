import type { Account } from '@/lib/server/auth/read-session';
import { importPlan } from '@/lib/server/commands/import-plan';
import { startBuild } from '@/lib/server/commands/start-build';
import { db } from '@/lib/server/db';
import type { CrewRole } from '@/lib/server/policies/build';
import type { CrewMember } from '@/models/crew-member';
import { makeAccount } from './accounts';
import { demoPlan } from './plans';

/** A build of the folding trestles, with its owner. */
export async function startedBuild(
  by?: Account,
): Promise<{ owner: Account; planId: string; buildId: string; contentHash: string }> {
  const owner = by ?? (await makeAccount());
  const { planId, contentHash } = await importPlan(owner, demoPlan('folding-trestles'));
  const { buildId } = await startBuild(owner, planId, 'Trestles');
  return { owner, planId, buildId, contentHash };
}

/** Makes someone a member of a build's crew. */
export async function joinCrew(buildId: string, { id }: Account, role: CrewRole): Promise<CrewMember> {
  return db().models.CrewMember.create({ buildId, accountId: id, role, joinedAt: new Date() });
}
