import 'server-only';
import { db } from '../db';
import { hashPassword, isOutdated, verifyPassword } from './password-hash';

/**
 * Whose account an address and a password open; null for a wrong password, an unknown address and an address that was not
 * confirmed alike. Each takes one lookup and one Argon2 verification, so neither the answer nor its time tells which.
 *
 * Not even someone who knows the password is told that an address awaits confirmation: they may have signed up with
 * another person's address to learn whether it was free.
 */
export async function checkCredentials(email: string, password: string): Promise<string | null> {
  const account = await db().models.Account.findOne({ where: { email } });
  const fits = await verifyPassword(account?.passwordHash ?? null, password);
  if (!account?.emailConfirmedAt || !fits) return null;
  if (isOutdated(account.passwordHash)) await account.update({ passwordHash: await hashPassword(password) });
  return account.id;
}
