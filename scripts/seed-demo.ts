import { readFileSync } from 'node:fs';
import { v7 } from 'uuid';
import { hashPassword } from '@/lib/server/auth/password-hash';
import { appendLog } from '@/lib/server/commands/append-log';
import { importPlan } from '@/lib/server/commands/import-plan';
import { startBuild } from '@/lib/server/commands/start-build';
import { db } from '@/lib/server/db';
import type { Account } from '@/models/account';
import { demoLog } from './demo-log';
import { demoPassword, demoSignIns } from './demo.mjs';

const PLANS = ['hall-bench', 'folding-trestles'];

/**
 * Puts the demo in: its accounts, both plans as public ones of the author, and a build of the hall bench under way, with
 * a helper. Each part that is there already stays as it is, so a start that was cut short is made good by the next.
 *
 * @returns false when all of it was there
 */
export async function seedDemo(now = Date.now()): Promise<boolean> {
  const { Account, Build, CrewMember } = db().models;
  let added = false;
  const passwordHash = await hashPassword(demoPassword);
  const accounts: Account[] = [];
  for (const { email, name, role } of demoSignIns) {
    const [account, isNew] = await Account.findOrCreate({
      where: { email },
      defaults: { email, name, passwordHash, role: role as 'member' | 'author', emailConfirmedAt: new Date(now) },
    });
    accounts.push(account);
    added ||= isNew;
  }
  const [builder, helper, author] = accounts as [Account, Account, Account];
  const planIds: string[] = [];
  for (const name of PLANS) {
    const text = readFileSync(`plans/${name}.json`, 'utf8');
    const { planId, isNew } = await importPlan(author, text, { visibility: 'public' });
    planIds.push(planId);
    added ||= isNew;
  }
  if (await Build.findOne({ where: { createdBy: builder.id } })) return added;
  const { buildId } = await startBuild(builder, planIds[0]!, 'Hall bench');
  await CrewMember.create({ buildId, accountId: helper.id, role: 'helper', joinedAt: new Date(now) });
  const deviceId = v7();
  const entries = demoLog({ buildId, deviceId, now }).map((entry) => ({ ...entry }));
  await appendLog(buildId, builder, { deviceId, accountId: builder.id, cursor: 0, sentAt: now, entries }, now);
  return true;
}
