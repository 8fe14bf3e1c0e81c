import 'server-only';
import type { Transaction } from 'sequelize';
import { db } from '../db';
import type { CrewRole } from '../policies/build';

/** Role of an account in a build's crew at this moment; null for none and for one who was removed. */
export async function roleOnBuild(buildId: string, accountId: string): Promise<CrewRole | null> {
  const place = await placeInCrew(buildId, accountId);
  return place === null || place.removed ? null : place.role;
}

/** Place of an account in a build's crew, ended ones too; null for someone who never had one. */
export async function placeInCrew(
  buildId: string,
  accountId: string,
  transaction?: Transaction,
): Promise<{ role: CrewRole; removed: boolean } | null> {
  const member = await db().models.CrewMember.findOne({ where: { buildId, accountId }, transaction });
  return member && { role: member.role, removed: member.removedAt !== null };
}
