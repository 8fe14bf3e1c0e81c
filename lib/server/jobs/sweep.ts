import 'server-only';
import { Op } from 'sequelize';
import { db } from '../db';

const DAY_MS = 24 * 60 * 60 * 1_000;
/** Ended links and sign-ins stay readable for a while, should someone ask what happened. */
const KEEP_ENDED_MS = 30 * DAY_MS;
/** An account whose address was never confirmed gives the address free again, counted from the last sign-up with it. */
const KEEP_UNCONFIRMED_MS = 30 * DAY_MS;

/** Removes counts, links and sign-ins that ended long ago, and sign-ups that were never confirmed. */
export async function sweep(now = new Date()): Promise<void> {
  const { Account, Session, Throttle, Token } = db().models;
  const endedBefore = new Date(now.getTime() - KEEP_ENDED_MS);
  await Throttle.destroy({ where: { windowEndsAt: { [Op.lt]: now } } });
  await Token.destroy({ where: { expiresAt: { [Op.lt]: endedBefore } } });
  await Session.destroy({
    where: { [Op.or]: [{ expiresAt: { [Op.lt]: endedBefore } }, { revokedAt: { [Op.lt]: endedBefore } }] },
  });
  await Account.destroy({
    where: { emailConfirmedAt: null, updatedAt: { [Op.lt]: new Date(now.getTime() - KEEP_UNCONFIRMED_MS) } },
  });
}
