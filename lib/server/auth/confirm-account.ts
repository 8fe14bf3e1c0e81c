import 'server-only';
import { db } from '../db';
import { AppError } from '../errors';
import { findToken, useToken } from './link-token';
import { verifyPassword } from './password-hash';

/**
 * Confirms the address of a new account. The link shows that someone reads the mail, the password that it is the one who
 * signed up.
 *
 * @returns the address, for signing in with
 * @throws AppError `link-spent`, or `wrong-password`, which leaves the link usable
 */
export async function confirmAccount(secret: string, password: string, now = new Date()): Promise<{ email: string }> {
  const { sequelize, models } = db();
  const token = await findToken(secret, 'confirm-email', now);
  const account = await models.Account.findByPk(token.accountId, { rejectOnEmpty: true });
  const { id, passwordHash } = account;
  if (!(await verifyPassword(passwordHash, password))) throw wrongPassword();
  await sequelize.transaction(async (transaction) => {
    await useToken(token, transaction, now);
    // Only with the password that was checked: another sign-up with this address may have replaced it since.
    const [confirmed] = await models.Account.update(
      { emailConfirmedAt: account.emailConfirmedAt ?? now },
      { where: { id, passwordHash }, transaction },
    );
    if (confirmed !== 1) throw wrongPassword();
  });
  return { email: account.email };
}

function wrongPassword(): AppError {
  return new AppError(
    'wrong-password',
    'That is not the password of the last sign-up with this address. Try again, or set a new one under "Forgotten password"; that confirms the address as well.',
  );
}
