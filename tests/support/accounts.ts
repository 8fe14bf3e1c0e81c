import { randomBytes } from 'node:crypto';
import { encode } from 'next-auth/jwt';
import { hashPassword } from '@/lib/server/auth/password-hash';
import { SESSION_MAX_AGE_S, sessionCookieName } from '@/lib/server/auth/session-cookie';
import { openSession } from '@/lib/server/auth/sessions';
import { db } from '@/lib/server/db';
import { env } from '@/lib/server/env';

export const PASSWORD = 'three clamps and a caul';

interface AccountFacts {
  email?: string;
  name?: string;
  password?: string;
  role?: 'member' | 'author' | 'operator';
  /** Whether the address was confirmed; yes unless said. */
  confirmed?: boolean;
}

/** An account as sign-up and confirmation leave it. */
export async function makeAccount({
  email = `builder-${randomBytes(5).toString('hex')}@example.org`,
  name = 'A builder',
  password = PASSWORD,
  role = 'member',
  confirmed = true,
}: AccountFacts = {}): Promise<{
  id: string;
  email: string;
  name: string;
  password: string;
  role: 'member' | 'author' | 'operator';
}> {
  const row = await db().models.Account.create({
    email,
    name,
    role,
    passwordHash: await hashPassword(password),
    emailConfirmedAt: confirmed ? new Date() : null,
  });
  return { id: row.id, email, name, password, role };
}

/** A sign-in of this account: its row, and the Cookie header that goes with it. */
export async function signedIn(
  accountId: string,
  userAgent = 'Mozilla/5.0 (X11; Linux x86_64; rv:140.0) Gecko/20100101 Firefox/140.0',
): Promise<{ sessionId: string; cookie: string }> {
  const sessionId = await openSession(accountId, userAgent);
  const token = await encode({
    token: { sub: accountId, sid: sessionId },
    secret: env().NEXTAUTH_SECRET,
    maxAge: SESSION_MAX_AGE_S,
  });
  return { sessionId, cookie: `${sessionCookieName()}=${token}` };
}
