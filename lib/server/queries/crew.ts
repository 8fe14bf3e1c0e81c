import 'server-only';
import type { Transaction } from 'sequelize';
import { db } from '../db';
import type { CrewRole } from '../policies/build';

/** Role of an account in a build's crew at this moment; null for none and for one who was removed. */
export async function roleOnBuild(
  buildId: string,
  accountId: string,
  transaction?: Transaction,
): Promise<CrewRole | null> {
  const member = await db().models.CrewMember.findOne({ where: { buildId, accountId, removedAt: null }, transaction });
  return member?.role ?? null;
}
