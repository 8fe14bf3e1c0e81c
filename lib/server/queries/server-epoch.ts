import 'server-only';
import { db } from '../db';

/** Epoch of this database (S7): one value from its making to its next restore. */
export async function readEpoch(): Promise<string> {
  const row = await db().models.ServerEpoch.findByPk(1, { rejectOnEmpty: true });
  return row.epoch;
}
