import 'server-only';
import { Op, type Transaction } from 'sequelize';
import { deviceWords } from '@/lib/domain/account/device-words';
import { db } from '../db';
import { SESSION_IDLE_S } from './session-cookie';

/** Longest User-Agent that is kept. */
const MAX_USER_AGENT = 400;

/** A sign-in as its owner sees it. */
export interface ListedSession {
  id: string;
  /** "Firefox on an Android phone" */
  device: string;
  signedInAt: string;
  lastSeenAt: string;
  /** The one that asks. */
  current: boolean;
}

/** Notes a new sign-in; its id goes into the cookie. */
export async function openSession(accountId: string, userAgent: string, now = new Date()): Promise<string> {
  const row = await db().models.Session.create({
    accountId,
    userAgent: userAgent.slice(0, MAX_USER_AGENT),
    lastSeenAt: now,
    expiresAt: new Date(now.getTime() + SESSION_IDLE_S * 1_000),
  });
  return row.id;
}

/** Every sign-in of the account that still stands: the one that asks, then the one last seen. */
export async function listSessions(accountId: string, currentId: string, now = new Date()): Promise<ListedSession[]> {
  const rows = await db().models.Session.findAll({
    where: { accountId, revokedAt: null, expiresAt: { [Op.gt]: now } },
    order: [['lastSeenAt', 'DESC']],
  });
  const current = rows.filter((row) => row.id === currentId);
  const others = rows.filter((row) => row.id !== currentId);
  return [...current, ...others].map((row) => ({
    id: row.id,
    device: deviceWords(row.userAgent),
    signedInAt: row.createdAt.toISOString(),
    lastSeenAt: row.lastSeenAt.toISOString(),
    current: row.id === currentId,
  }));
}

/** Ends one sign-in of the account; false when there is none such that still stands. */
export async function revokeSession(accountId: string, id: string, now = new Date()): Promise<boolean> {
  const [ended] = await db().models.Session.update({ revokedAt: now }, { where: { id, accountId, revokedAt: null } });
  return ended === 1;
}

/** Ends every sign-in of the account, or every one but the one that asks. Returns how many. */
export async function revokeSessions(
  accountId: string,
  { except, transaction, now = new Date() }: { except?: string; transaction?: Transaction; now?: Date } = {},
): Promise<number> {
  const others = except === undefined ? {} : { id: { [Op.ne]: except } };
  const [ended] = await db().models.Session.update(
    { revokedAt: now },
    { where: { accountId, revokedAt: null, ...others }, transaction },
  );
  return ended;
}
