import { readFileSync } from 'node:fs';
import { hashPassword } from '@/lib/server/auth/password-hash';
import { importPlan } from '@/lib/server/commands/import-plan';
import { startBuild } from '@/lib/server/commands/start-build';
import { db } from '@/lib/server/db';
import { demoPassword, demoSignIns } from './demo.mjs';

const PLANS = ['hall-bench', 'folding-trestles'];

/**
 * Puts the demo in: its accounts, both plans as public ones of the author, and a build of the hall bench with a helper.
 *
 * @returns false when it was there already
 */
export async function seedDemo(): Promise<boolean> {
  const { Account, CrewMember } = db().models;
  if (await Account.findOne({ where: { email: demoSignIns[0]!.email } })) return false;
  const passwordHash = await hashPassword(demoPassword);
  const [builder, helper, author] = await Promise.all(
    demoSignIns.map(({ email, name, role }) =>
      Account.create({ email, name, passwordHash, role: role as 'member' | 'author', emailConfirmedAt: new Date() }),
    ),
  );
  const planIds: string[] = [];
  for (const name of PLANS) {
    const text = readFileSync(`plans/${name}.json`, 'utf8');
    planIds.push((await importPlan(author!, text, { visibility: 'public' })).planId);
  }
  const { buildId } = await startBuild(builder!, planIds[0]!, 'Hall bench');
  await CrewMember.create({ buildId, accountId: helper!.id, role: 'helper', joinedAt: new Date() });
  return true;
}
