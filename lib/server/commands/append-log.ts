import 'server-only';
import { UniqueConstraintError, type Transaction } from 'sequelize';
import type { StandingEntry } from '@/lib/domain/build/entry';
import { applyEntries, emptyState } from '@/lib/domain/build/fold';
import { readEntry } from '@/lib/domain/build/read-entry';
import { assignStamp } from '@/lib/domain/build/stamp';
import { MAX_BATCH_ENTRIES, type LogAnswer, type LogPush, type RefusalCode } from '@/lib/domain/build/wire';
import type { Account } from '../auth/read-session';
import { db } from '../db';
import { AppError } from '../errors';
import { mayOnBuild, type CrewRole } from '../policies/build';
import { placeInCrew } from '../queries/crew';
import { entryHash, findKnownEntries, greatestStampUpTo, lastStampOf } from '../queries/known-entries';
import { readLogPage } from '../queries/log-page';

/** Greatest number that a column of positions holds. */
const GREATEST_POSITION = 2_147_483_647;

interface Judged {
  accepted: LogAnswer['accepted'];
  refused: LogAnswer['refused'];
  /** Role in the crew when it was judged; null for a removed member. */
  role: CrewRole | null;
}

/**
 * Takes a phone's entries into the log of a build and answers with others' entries after its cursor.
 *
 * One transaction: the build row is locked, each entry is authorised and judged by itself (S5), a known id gets its
 * stored answer (S2), a new one the next position and its stamp (S3, S4); the snapshot is folded and listeners are told
 * in the same transaction. Somebody removed from the crew is told so for each entry, and reads nothing any more.
 *
 * @throws AppError when the phone speaks for another account, the batch is past its limit, or the build is not there for
 *   this account
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
  if (push.entries.length > MAX_BATCH_ENTRIES) {
    throw new AppError('too-large', `At most ${MAX_BATCH_ENTRIES} entries are taken at a time. Nothing was stored.`);
  }
  const judge = () =>
    db().sequelize.transaction((transaction) => append(buildId, account, push, receivedAt, transaction));
  const { accepted, refused, role } = await judge().catch((error: unknown) => {
    // Another build took in one of these ids at the same moment. Judged again, the id is known.
    if (error instanceof UniqueConstraintError) return judge();
    throw error;
  });
  const page = await readLogPage(buildId, push.cursor, { withEntries: role !== null });
  return { format: 'holdfast-log', buildId, serverTime: Date.now(), accepted, refused, ...page };
}

async function append(
  buildId: string,
  account: Account,
  push: LogPush,
  receivedAt: number,
  transaction: Transaction,
): Promise<Judged> {
  const { Build, LogEntryRow } = db().models;
  const build = await Build.findByPk(buildId, { transaction, lock: transaction.LOCK.UPDATE });
  const place = build && (await placeInCrew(buildId, account.id, transaction));
  if (!build || !place) throw new AppError('not-found', 'There is no such build, or you are not of its crew.');
  const judged: Judged = { accepted: [], refused: [], role: place.removed ? null : place.role };
  const fresh: (StandingEntry & { position: number; contentHash: string })[] = [];
  const ids = push.entries.map(({ id }) => id);
  const known = await findKnownEntries(ids, transaction);
  let position = build.lastPosition;
  let previousStamp = await lastStampOf(buildId, push.deviceId, transaction);
  const seenStamps = new Map<number, number | null>();

  for (const raw of push.entries) {
    const refuse = (code: RefusalCode, message: string) => judged.refused.push({ id: raw.id, code, message });
    const read = readEntry(raw);
    if (!read.ok) {
      refuse(read.code, read.message);
      continue;
    }
    const { entry } = read;
    if (entry.seen > GREATEST_POSITION || entry.id !== entry.id.toLowerCase()) {
      refuse(
        'malformed',
        'The entry is not written as a phone writes it: its id in capitals, or more seen than there is.',
      );
      continue;
    }
    const contentHash = entryHash(raw);
    const stored = known.get(entry.id);
    if (stored) {
      if (stored.buildId === buildId && stored.accountId === account.id && stored.contentHash === contentHash) {
        judged.accepted.push({ id: entry.id, position: stored.position, stamp: stored.stamp });
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
    const verdict = mayOnBuild('append-log', judged.role);
    if (!verdict.ok) {
      refuse('not-allowed', place.removed ? 'You are no longer of the crew of this build.' : verdict.detail);
      continue;
    }
    const seen = Math.min(entry.seen, position);
    if (!seenStamps.has(seen)) seenStamps.set(seen, await greatestStampUpTo(buildId, seen, transaction));
    const stamp = assignStamp({
      madeAt: entry.madeAt,
      clockOffsetMs: receivedAt - push.sentAt,
      receivedAt,
      seenStamp: seenStamps.get(seen) ?? null,
      previousStamp,
    });
    position += 1;
    previousStamp = stamp;
    fresh.push({ ...entry, accountId: account.id, stamp, position, contentHash });
    judged.accepted.push({ id: entry.id, position, stamp });
    known.set(entry.id, { buildId, accountId: account.id, contentHash, position, stamp });
  }

  if (fresh.length > 0) {
    await LogEntryRow.bulkCreate(
      fresh.map((entry) => ({ ...entry, receivedAt: new Date(receivedAt) })),
      { transaction },
    );
    await build.update({ lastPosition: position }, { transaction });
    await foldSnapshot(buildId, position, fresh, transaction);
    await db().sequelize.query("select pg_notify('build_log', :told)", {
      replacements: { told: JSON.stringify({ buildId, position }) },
      transaction,
    });
  }
  return judged;
}

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
