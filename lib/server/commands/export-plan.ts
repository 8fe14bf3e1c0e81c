import 'server-only';
import type { Account } from '../auth/read-session';
import { AppError } from '../errors';
import { mayOnPlan } from '../policies/plan';
import { demand } from '../policies/verdict';
import { exportRevision, findCurrentRevision } from '../queries/plans';

/** A plan's present revision as the text of a file. */
export async function exportPlan(account: Account, planId: string): Promise<{ fileName: string; text: string }> {
  const found = await findCurrentRevision(planId);
  if (!found) throw new AppError('not-found', 'There is no such plan, or it is not yours to see.');
  demand(mayOnPlan('export', { ...found, accountId: account.id }));
  const document = await exportRevision(found.revision);
  return { fileName: `${document.id}.json`, text: `${JSON.stringify(document, null, 2)}\n` };
}
