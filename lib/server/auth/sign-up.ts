import 'server-only';
import { QueryTypes } from 'sequelize';
import { v7 } from 'uuid';
import { db } from '../db';
import { orderLetter } from '../jobs/queue';
import { hashPassword } from './password-hash';

export interface SignUp {
  name: string;
  email: string;
  password: string;
}

/**
 * Opens an account, or, where the address has one already, does the same work and changes nothing that counts: the letter
 * says which it was, so the answer cannot be used to find out who has an account.
 *
 * An account that nobody has confirmed yet takes the latest name and password; confirming asks for that password, so
 * someone who signs up with another person's address cannot have it confirmed by them.
 */
export async function signUp({ name, email, password }: SignUp, now = new Date()): Promise<void> {
  const passwordHash = await hashPassword(password);
  await db().sequelize.query(
    `INSERT INTO accounts AS a (id, email, name, password_hash, role, created_at, updated_at)
     VALUES (:id, :email, :name, :passwordHash, 'member', :now, :now)
     ON CONFLICT (email) DO UPDATE
       SET name = excluded.name, password_hash = excluded.password_hash, updated_at = excluded.updated_at
       WHERE a.email_confirmed_at IS NULL`,
    { replacements: { id: v7(), email, name, passwordHash, now }, type: QueryTypes.INSERT },
  );
  await orderLetter({ letter: 'confirm-address', email });
}
