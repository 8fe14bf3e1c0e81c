import 'server-only';
import { v7 } from 'uuid';
import { db } from '../db';

/**
 * Gives the database a new epoch, to be done once after it was restored from a backup: every phone then asks from the
 * start and sends again what the backup did not hold (S7). Done without need it costs each phone one such round.
 *
 * @returns the new epoch
 */
export async function renewEpoch(): Promise<string> {
  const epoch = v7();
  await db().models.ServerEpoch.update({ epoch }, { where: { id: 1 } });
  return epoch;
}
