import 'server-only';
import { db } from '../db';
import { AppError } from '../errors';
import { forgetTries, throttle } from '../throttle';
import { verifyPassword } from './password-hash';

/**
 * Lets an act that could lose someone their account go on only with their present password, and counts the tries.
 *
 * @throws AppError `wrong-password` or `too-many`
 */
export async function provePassword(accountId: string, password: string): Promise<void> {
  await throttle('password:account', accountId);
  const account = await db().models.Account.findByPk(accountId);
  if (!(await verifyPassword(account?.passwordHash ?? null, password))) {
    throw new AppError('wrong-password', 'That is not your present password. Nothing was changed.', {
      fields: [{ path: 'present', message: 'That is not your present password.' }],
    });
  }
  await forgetTries('password:account', accountId);
}
