import 'server-only';
import { db } from '../db';

/** Changes the name that the crew and the log show from now on. */
export async function changeName(accountId: string, name: string): Promise<{ name: string }> {
  await db().models.Account.update({ name }, { where: { id: accountId } });
  return { name };
}
