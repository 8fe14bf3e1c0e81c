import 'server-only';
import { createHash } from 'node:crypto';
import canonicalize from 'canonicalize';
import { QueryTypes, type Transaction } from 'sequelize';
import type { LogEntry, StandingEntry } from '@/lib/domain/build/entry';
import { applyEntries, emptyState } from '@/lib/domain/build/fold';
import { readEntry } from '@/lib/domain/build/read-entry';
import { assignStamp } from '@/lib/domain/build/stamp';
import type { LogAnswer, LogPush, RefusalCode } from '@/lib/domain/build/wire';
import type { Account } from '../auth/read-session';
import { db } from '../db';
import { AppError } from '../errors';
import { mayOnBuild } from '../policies/build';
import { roleOnBuild } from '../queries/crew';
import { readLogPage } from '../queries/log-page';
import { readEpoch } from '../queries/server-epoch';

type Accepted = LogAnswer['accepted'][number];
type Refused = LogAnswer['refused'][number];

interface Verdicts {
  accepted: Accepted[];
  refused: Refused[];
  fresh: StandingEntry[];
}

/**
 * Takes a phone's entries into the log of a build and answers with others' entries after its cursor.
 *
 * One transaction: the build row is locked, each entry is authorised and judged by itself (S5), a known id gets its
 * stored answer (S2), a new one the next position and its stamp (S3, S4); the snapshot is folded and listeners are told
 * in the same transaction.
 *
 * @throws AppError when the phone speaks for another account or the build is not there for this one
 */
export async function appendLog(
  buildId: string,
  account: Account,
  push: LogPush,
  receivedAt: number,
): Promise<LogAnswer> {
  if (push.accountId !== account.id) {
    throw new AppError(
      'wrong-account',
      'These records were made under another account. Sign in with that account to send them.',
    );
  }
  const { accepted, refused } = await db().sequelize.transaction((transaction) =>
    append(buildId, account, push, receivedAt, transaction),
  );
  const [page, epoch] = await Promise.all([readLogPage(buildId, push.cursor), readEpoch()]);
  return { format: 'holdfast-log', epoch, buildId, serverTime: Date.now(), accepted, refused, ...page };
}

async function append(
  buildId: string,
  account: Account,
  push: LogPush,
  receivedAt: number,
  transaction: Transaction,
): Promise<Verdicts> {
  const { Build, LogEntryRow } = db().models;
  const verdicts: Verdicts = { accepted: [], refused: [], fresh: [] };
  const build = await Build.findByPk(buildId, { transaction, lock: transaction.LOCK.UPDATE });
  if (!build) throw new AppError('not-found', 'There is no such build, or you are not of its crew.');
  const role = await roleOnBuild(buildId, account.id, transaction);
  const known = await knownEntries(
    push.entries.map(({ id }) => id),
    transaction,
  );
  const clockOffsetMs = receivedAt - push.sentAt;
  let position = build.lastPosition;
  let previousStamp = await lastStampOf(buildId, push.deviceId, transaction);
  const seenStamps = new Map<number, number | null>();

  for (const raw of push.entries) {
    const refuse = (code: RefusalCode, message: string) => verdicts.refused.push({ id: raw.id, code, message });
    const read = readEntry(raw);
    if (!read.ok) {
      refuse(read.code, read.message);
      continue;
    }
    const { entry } = read;
    const contentHash = hashEntry(entry);
    const stored = known.get(entry.id);
    if (stored) {
      if (stored.buildId === buildId && stored.accountId === account.id && stored.contentHash === contentHash) {
        verdicts.accepted.push({ id: entry.id, position: stored.position, stamp: stored.stamp });
      } else {
        refuse('id-reused', 'An entry with this id is already in the log and says something else.');
      }
      continue;
    }
    if (entry.buildId !== buildId) {
      refuse('wrong-build', 'This entry belongs to another build.');
      continue;
    }
    if (entry.deviceId !== push.deviceId) {
      refuse('malformed', 'This entry names another phone than the one that sent it.');
      continue;
    }
    const verdict = mayOnBuild('append-log', role);
    if (!verdict.ok) {
      refuse('not-allowed', role === null ? 'You are no longer of the crew of this build.' : verdict.detail);
      continue;
    }
    const seen = Math.min(entry.seen, position);
    if (!seenStamps.has(seen)) seenStamps.set(seen, await greatestStampUpTo(buildId, seen, transaction));
    const stamp = assignStamp({
      madeAt: entry.madeAt,
      clockOffsetMs,
      receivedAt,
      seenStamp: seenStamps.get(seen) ?? null,
      previousStamp,
    });
    position += 1;
    previousStamp = stamp;
    const standing: StandingEntry = { ...entry, accountId: account.id, stamp, position };
    verdicts.fresh.push(standing);
    verdicts.accepted.push({ id: entry.id, position, stamp });
    known.set(entry.id, { buildId, accountId: account.id, contentHash, position, stamp });
  }

  if (verdicts.fresh.length > 0) {
    await LogEntryRow.bulkCreate(
      verdicts.fresh.map((entry) => ({
        ...entry,
        position: entry.position!,
        contentHash: known.get(entry.id)!.contentHash,
        receivedAt: new Date(receivedAt),
      })),
      { transaction },
    );
    await build.update({ lastPosition: position }, { transaction });
    await foldSnapshot(buildId, position, verdicts.fresh, transaction);
    await db().sequelize.query('select pg_notify(:channel, :position)', {
      replacements: { channel: 'build_log', position: JSON.stringify({ buildId, position }) },
      transaction,
    });
  }
  return verdicts;
}

interface Known {
  buildId: string;
  accountId: string;
  contentHash: string;
  position: number;
  stamp: number;
}

async function knownEntries(ids: string[], transaction: Transaction): Promise<Map<string, Known>> {
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

async function greatest(
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

const greatestStampUpTo = (buildId: string, position: number, transaction: Transaction) =>
  greatest(
    'select max(stamp) as stamp from log_entries where build_id = :buildId and position <= :position',
    { buildId, position },
    transaction,
  );

const lastStampOf = (buildId: string, deviceId: string, transaction: Transaction) =>
  greatest(
    'select stamp from log_entries where build_id = :buildId and device_id = :deviceId order by position desc limit 1',
    { buildId, deviceId },
    transaction,
  );

async function foldSnapshot(
  buildId: string,
  position: number,
  fresh: StandingEntry[],
  transaction: Transaction,
): Promise<void> {
  const { Snapshot } = db().models;
  const before = await Snapshot.findByPk(buildId, { transaction });
  const state = applyEntries(before?.state ?? emptyState(), fresh);
  await Snapshot.upsert({ buildId, position, state }, { transaction });
}

function hashEntry({ id, buildId, deviceId, madeAt, seen, kind, v, target, value }: LogEntry): string {
  const text = canonicalize({ id, buildId, deviceId, madeAt, seen, kind, v, target, value });
  return createHash('sha256').update(text!).digest('hex');
}
