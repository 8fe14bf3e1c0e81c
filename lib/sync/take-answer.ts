import { compareStanding, type StandingEntry } from '../domain/build/entry';
import { applyEntries, foldEntries } from '../domain/build/fold';
import type { LogAnswer } from '../domain/build/wire';
import { durably } from '../store/saved';
import type { AccountDatabase } from '../store/database';
import type { EntryRow } from '../store/rows';

/** What taking an answer in came to. */
export interface Taken {
  more: boolean;
  /** The server's database was restored (S7): everything acknowledged is held again and will be sent again. */
  restored: boolean;
}

/**
 * Takes a log answer in, in ONE transaction: standings of what was accepted, refusals with their reason, others' entries
 * and the cursor together. Taking the same answer twice changes nothing.
 */
export async function takeAnswer(db: AccountDatabase, answer: LogAnswer): Promise<Taken> {
  const taken = await durably<Taken>(db, () =>
    db.transaction('rw', db.builds, db.entries, db.photos, async (): Promise<Taken> => {
      const build = await db.builds.get(answer.buildId);
      if (!build) return { more: false, restored: false };
      if (build.epoch !== answer.epoch) return startOver(db, answer);

      const changed: EntryRow[] = [];
      const settle = async (id: string, change: Partial<EntryRow>) => {
        const row = await db.entries.get(id);
        if (row) changed.push({ ...row, ...change } as EntryRow);
      };
      for (const { id, position, stamp } of answer.accepted)
        await settle(id, { position, stamp, sync: 'accepted', refusal: undefined });
      for (const { id, code, message } of answer.refused)
        await settle(id, { sync: 'refused', refusal: { code, message } });
      for (const entry of answer.entries) changed.push({ ...(entry as unknown as StandingEntry), sync: 'accepted' });
      await db.entries.bulkPut(changed);

      const standing = changed.filter(({ sync }) => sync === 'accepted');
      // A refused entry leaves the state, which only a new fold can do.
      const state =
        answer.refused.length > 0
          ? foldEntries(await standingEntries(db, build.id))
          : applyEntries(build.state, standing);
      const greatestStamp = standing.reduce<number | null>(
        (most, { stamp }) => Math.max(most ?? stamp, stamp),
        build.greatestStamp,
      );
      await db.builds.update(build.id, { state, greatestStamp, cursor: Math.max(build.cursor, answer.cursor) });
      return { more: answer.more, restored: false };
    }),
  );
  if ('ok' in taken) throw new Error(taken.message);
  return taken;
}

/** S7: forget the positions of the old database, hold all that was acknowledged, photos too, and pull from the start. */
async function startOver(db: AccountDatabase, { buildId, epoch }: LogAnswer): Promise<Taken> {
  const rows = await db.entries.where({ buildId, sync: 'accepted' }).toArray();
  // Others' entries come back from the server or from their own phones; only this account's are this phone's to send.
  const own = rows.filter(({ accountId, deviceId }) => accountId === db.accountId && deviceId === db.deviceId);
  const others = rows.filter((row) => !own.includes(row));
  await db.entries.bulkPut(own.map((row) => ({ ...row, position: null, sync: 'held' }) as EntryRow));
  await db.entries.bulkDelete(others.map(({ id }) => id));
  const confirmed = db.photos
    .where('buildId')
    .equals(buildId)
    .filter(({ sync }) => sync === 'confirmed');
  await confirmed.modify({ sync: 'held' });
  await db.builds.update(buildId, { epoch, cursor: 0, state: foldEntries(await standingEntries(db, buildId)) });
  return { more: true, restored: true };
}

async function standingEntries(db: AccountDatabase, buildId: string): Promise<StandingEntry[]> {
  const rows = await db.entries.where('buildId').equals(buildId).toArray();
  return rows.filter(({ sync }) => sync !== 'refused').sort(compareStanding);
}

/** Refuses entries that no server would take, with its words; the rest goes on (S5). */
export async function refuseEntries(
  db: AccountDatabase,
  buildId: string,
  ids: readonly string[],
  message: string,
): Promise<void> {
  const done = await durably(db, () =>
    db.transaction('rw', db.builds, db.entries, async () => {
      await db.entries
        .where('id')
        .anyOf([...ids])
        .modify({ sync: 'refused', refusal: { code: 'not-allowed', message } });
      await db.builds.update(buildId, { state: foldEntries(await standingEntries(db, buildId)) });
    }),
  );
  if (done) throw new Error(done.message);
}
