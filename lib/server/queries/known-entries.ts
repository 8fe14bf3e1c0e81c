import 'server-only';
import { createHash } from 'node:crypto';
import canonicalize from 'canonicalize';
import { QueryTypes, type Transaction } from 'sequelize';
import { storable } from '@/lib/domain/storable-text';
import { db } from '../db';

/** What the log holds of an entry, as far as a repeat is judged by it (S2). */
export interface KnownEntry {
  buildId: string;
  accountId: string;
  contentHash: string;
  position: number;
  stamp: number;
}

/** Entries of any build that have one of these ids, by id. */
export async function findKnownEntries(ids: string[], transaction: Transaction): Promise<Map<string, KnownEntry>> {
  if (ids.length === 0) return new Map();
  const rows = await db().models.LogEntryRow.findAll({
    attributes: ['id', 'buildId', 'accountId', 'contentHash', 'position', 'stamp'],
    where: { id: ids },
    transaction,
  });
  return new Map(
    rows.map(({ id, buildId, accountId, contentHash, position, stamp }) => [
      id,
      { buildId, accountId, contentHash, position, stamp },
    ]),
  );
}

/**
 * SHA-256 of an entry as the phone sent it, before it is brought to the present version: a repeat has the same hash
 * whichever version of the program judges it.
 */
export function entryHash(raw: Record<string, unknown>): string {
  const { id, buildId, deviceId, madeAt, seen, kind, v, target, value } = raw;
  const text = canonicalize(storable({ id, buildId, deviceId, madeAt, seen, kind, v, target, value }));
  return createHash('sha256').update(text!).digest('hex');
}

/** Greatest stamp among a build's entries up to a position, or null (S4: what a phone had seen). */
export const greatestStampUpTo = (buildId: string, position: number, transaction: Transaction) =>
  stampOf(
    'select max(stamp) as stamp from log_entries where build_id = :buildId and position <= :position',
    { buildId, position },
    transaction,
  );

/** Stamp of a phone's newest entry in a build, or null. */
export const lastStampOf = (buildId: string, deviceId: string, transaction: Transaction) =>
  stampOf(
    'select stamp from log_entries where build_id = :buildId and device_id = :deviceId order by position desc limit 1',
    { buildId, deviceId },
    transaction,
  );

async function stampOf(
  sql: string,
  replacements: Record<string, unknown>,
  transaction: Transaction,
): Promise<number | null> {
  const [row] = await db().sequelize.query<{ stamp: string | null }>(sql, {
    replacements,
    transaction,
    type: QueryTypes.SELECT,
  });
  return row?.stamp ? Number(row.stamp) : null;
}
