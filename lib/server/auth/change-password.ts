import 'server-only';
import { db } from '../db';
import { orderLetter } from '../jobs/queue';
import { endTokens } from './link-token';
import { hashPassword } from './password-hash';
import { provePassword } from './prove-password';
import type { SignedIn } from './read-session';
import { revokeSessions } from './sessions';

/**
 * Changes the password of someone who is signed in and knows the present one. Their other sign-ins end, and so do links
 * that could undo it.
 *
 * @throws AppError `wrong-password`
 */
export async function changePassword(
  { account, session }: SignedIn,
  present: string,
  password: string,
  now = new Date(),
): Promise<void> {
  const { sequelize, models } = db();
  await provePassword(account.id, present);
  const passwordHash = await hashPassword(password);
  await sequelize.transaction(async (transaction) => {
    await models.Account.update({ passwordHash }, { where: { id: account.id }, transaction });
    await endTokens(account.id, ['reset-password', 'change-email'], transaction, now);
    await revokeSessions(account.id, { except: session.id, transaction, now });
  });
  await orderLetter({ letter: 'password-changed', accountId: account.id });
}
