import 'server-only';
import { db } from '../db';
import { orderLetter } from '../jobs/queue';
import { endTokens, findToken, useToken } from './link-token';
import { hashPassword } from './password-hash';
import { revokeSessions } from './sessions';

/**
 * Sets a new password by a link from a letter. Every sign-in and every other link of the account ends; an address that was
 * not yet confirmed is confirmed by it, since the letter was read.
 *
 * @returns the address, for signing in with
 * @throws AppError `link-spent`
 */
export async function resetPassword(secret: string, password: string, now = new Date()): Promise<{ email: string }> {
  const { sequelize, models } = db();
  const token = await findToken(secret, 'reset-password', now);
  const passwordHash = await hashPassword(password);
  const account = await sequelize.transaction(async (transaction) => {
    await useToken(token, transaction, now);
    await endTokens(token.accountId, ['confirm-email', 'change-email'], transaction, now);
    const row = await models.Account.findByPk(token.accountId, { transaction, rejectOnEmpty: true });
    await row.update({ passwordHash, emailConfirmedAt: row.emailConfirmedAt ?? now }, { transaction });
    await revokeSessions(row.id, { transaction, now });
    return row;
  });
  await orderLetter({ letter: 'password-changed', accountId: account.id });
  return { email: account.email };
}
