import 'server-only';
import { createHash, randomBytes } from 'node:crypto';
import { Op, type Transaction } from 'sequelize';
import type { Token } from '@/models/token';
import { db } from '../db';
import { AppError } from '../errors';

export type LinkPurpose = Token['purpose'];

const HOUR_MS = 60 * 60 * 1_000;

/** How long a link in a letter works. */
export const linkLifeMs: Record<LinkPurpose, number> = {
  'confirm-email': 48 * HOUR_MS,
  'reset-password': HOUR_MS,
  'change-email': 24 * HOUR_MS,
};

/** What the database keeps of a link's secret: 256 random bits need no slow hash. */
export function hashToken(secret: string): string {
  return createHash('sha256').update(secret).digest('hex');
}

/**
 * Makes a link that works once.
 *
 * @param email  the address that the link proves, where that is not the account's own
 * @returns the secret for the letter, in base64url; it is stored nowhere
 */
export async function issueToken(
  accountId: string,
  purpose: LinkPurpose,
  email: string | null = null,
  now = new Date(),
): Promise<string> {
  const secret = randomBytes(32).toString('base64url');
  await db().models.Token.create({
    accountId,
    purpose,
    tokenHash: hashToken(secret),
    email,
    expiresAt: new Date(now.getTime() + linkLifeMs[purpose]),
  });
  return secret;
}

/**
 * The link as it stands, unused and in time, without using it.
 *
 * @throws AppError `link-spent`
 */
export async function findToken(secret: string, purpose: LinkPurpose, now = new Date()): Promise<Token> {
  const token = await db().models.Token.findOne({
    where: { tokenHash: hashToken(secret), purpose, usedAt: null, expiresAt: { [Op.gt]: now } },
  });
  if (!token) throw spent();
  return token;
}

/**
 * Uses the link, once: of two requests at the same moment one gets through. The account's other links of this purpose end
 * with it.
 *
 * @throws AppError `link-spent`
 */
export async function useToken(token: Token, transaction: Transaction, now = new Date()): Promise<void> {
  const { Token } = db().models;
  const [used] = await Token.update({ usedAt: now }, { where: { id: token.id, usedAt: null }, transaction });
  if (used !== 1) throw spent();
  await endTokens(token.accountId, [token.purpose], transaction, now);
}

/** Ends every unused link of these purposes. */
export async function endTokens(
  accountId: string,
  purposes: LinkPurpose[],
  transaction: Transaction,
  now = new Date(),
): Promise<void> {
  await db().models.Token.update(
    { usedAt: now },
    { where: { accountId, purpose: purposes, usedAt: null }, transaction },
  );
}

function spent(): AppError {
  return new AppError('link-spent', 'This link was used already, has run out, or was replaced by a newer one.');
}
