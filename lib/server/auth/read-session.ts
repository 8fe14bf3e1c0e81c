import 'server-only';
import { Op } from 'sequelize';
import type { Account as AccountRow } from '@/models/account';
import type { Session as SessionRow } from '@/models/session';
import { db } from '../db';
import { readClaims, SESSION_IDLE_S, SESSION_MAX_AGE_S, type SessionClaims } from './session-cookie';

/** The person behind a request, as far as a handler may know. */
export interface Account {
  id: string;
  email: string;
  name: string;
  role: 'member' | 'author' | 'operator';
}

/** One sign-in on one device. */
export interface Session {
  id: string;
  expiresAt: Date;
}

export interface SignedIn {
  account: Account;
  session: Session;
}

/** Being seen is written down no more often than this, so that a busy page is not a row update a request. */
const SEEN_EVERY_MS = 60_000;

/**
 * Who a request comes from, judged by the session row at this moment: a sign-in that was revoked, or has run out, or
 * whose address was never confirmed, is none.
 *
 * @param cookieHeader  the request's Cookie header
 */
export async function readSession(cookieHeader: string | null): Promise<SignedIn | null> {
  const claims = await readClaims(cookieHeader);
  return claims && findStanding(claims);
}

/** The sign-in that these claims name, if it still stands; notes that it was seen and so keeps it from running out. */
export async function findStanding(claims: SessionClaims, now = new Date()): Promise<SignedIn | null> {
  const { Account, Session } = db().models;
  const row = (await Session.findOne({
    where: { id: claims.sid, accountId: claims.sub, revokedAt: null, expiresAt: { [Op.gt]: now } },
    include: [{ model: Account, as: 'account', required: true, where: { emailConfirmedAt: { [Op.ne]: null } } }],
  })) as (SessionRow & { account: AccountRow }) | null;
  if (!row) return null;
  if (now.getTime() - row.lastSeenAt.getTime() >= SEEN_EVERY_MS) await noteSeen(row, now);
  const { id, email, name, role } = row.account;
  return { account: { id, email, name, role }, session: { id: row.id, expiresAt: row.expiresAt } };
}

async function noteSeen(row: SessionRow, now: Date): Promise<void> {
  const longest = row.createdAt.getTime() + SESSION_MAX_AGE_S * 1_000;
  const expiresAt = new Date(Math.min(now.getTime() + SESSION_IDLE_S * 1_000, longest));
  await db().models.Session.update({ lastSeenAt: now, expiresAt }, { where: { id: row.id, revokedAt: null } });
}
