import 'server-only';
import type { Account } from '../auth/read-session';
import { db } from '../db';
import { AppError } from '../errors';
import { mayOnPlan } from '../policies/plan';
import { demand } from '../policies/verdict';
import { findCurrentRevision } from '../queries/plans';

/** Starts a build of a plan's present revision, with the person as its owner. */
export async function startBuild(account: Account, planId: string, name: string): Promise<{ buildId: string }> {
  const found = await findCurrentRevision(planId);
  if (!found) throw new AppError('not-found', 'There is no such plan, or it is not yours to see.');
  demand(mayOnPlan('start-build', { ...found, accountId: account.id }));
  const { Build, CrewMember } = db().models;
  return db().sequelize.transaction(async (transaction) => {
    const startedAt = new Date();
    const build = await Build.create(
      { name, planRevisionId: found.revision.id, createdBy: account.id, startedAt, lastPosition: 0 },
      { transaction },
    );
    await CrewMember.create(
      { buildId: build.id, accountId: account.id, role: 'owner', joinedAt: startedAt },
      { transaction },
    );
    return { buildId: build.id };
  });
}
