import 'server-only';
import { UniqueConstraintError } from 'sequelize';
import { db } from '../db';
import { AppError } from '../errors';
import { orderLetter } from '../jobs/queue';
import { findToken, useToken } from './link-token';
import { provePassword } from './prove-password';
import type { Account } from './read-session';

/**
 * Asks for a change of address: a link goes to the new one, a notice to the present one, and nothing changes until the
 * link is used. The answer is the same where the new address has an account already; the letter to it says so.
 *
 * @throws AppError `wrong-password`, or `invalid` when it is the present address
 */
export async function askForNewAddress(account: Account, newEmail: string, present: string): Promise<void> {
  if (newEmail === account.email) {
    const message = 'That is the address that you have already.';
    throw new AppError('invalid', message, { fields: [{ path: 'email', message }] });
  }
  await provePassword(account.id, present);
  await orderLetter({ letter: 'confirm-new-address', accountId: account.id, email: newEmail });
  await orderLetter({ letter: 'new-address-asked', email: account.email, newEmail });
}

/**
 * Takes the new address by the link that was sent to it.
 *
 * @throws AppError `link-spent`, or `conflict` where another account took the address in the meantime
 */
export async function confirmNewAddress(secret: string, now = new Date()): Promise<{ email: string }> {
  const { sequelize, models } = db();
  const token = await findToken(secret, 'change-email', now);
  const email = token.email;
  if (email === null) throw new Error(`Token ${token.id} for a change of address carries no address.`);
  const former = await sequelize
    .transaction(async (transaction) => {
      await useToken(token, transaction, now);
      const account = await models.Account.findByPk(token.accountId, { transaction, lock: true, rejectOnEmpty: true });
      const before = account.email;
      await account.update({ email, emailConfirmedAt: now }, { transaction });
      return before;
    })
    .catch((error: unknown) => {
      if (error instanceof UniqueConstraintError) {
        throw new AppError('conflict', 'Another account uses this address by now. Your address was not changed.');
      }
      throw error;
    });
  await orderLetter({ letter: 'address-changed', email: former, newEmail: email });
  return { email };
}
