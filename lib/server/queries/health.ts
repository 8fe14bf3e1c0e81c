import 'server-only';
import { db } from '../db';

/** @throws ConnectionError when the database does not answer */
export async function checkHealth(): Promise<{ format: 'holdfast-health'; ok: true }> {
  await db().sequelize.query('select 1');
  return { format: 'holdfast-health', ok: true };
}
