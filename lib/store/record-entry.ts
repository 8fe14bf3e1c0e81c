import type { Table } from 'dexie';
import { v7 } from 'uuid';
import type { StandingEntry } from '../domain/build/entry';
import { applyEntries } from '../domain/build/fold';
import type { EntryKind, EntryTarget, EntryValueInput } from '../domain/build/kinds';
import { makeEntry } from '../domain/build/make-entry';
import { estimateStamp } from '../domain/build/stamp';
import type { AccountDatabase } from './database';
import type { SyncStatus } from './rows';
import { durably, type NotSaved, type Saved } from './saved';

interface Beside {
  /** Other tables that the same transaction writes. */
  tables: Table[];
  write: () => Promise<unknown>;
}

/**
 * Writes one entry and the folded state in ONE transaction, and answers when it has completed (S1). Everything that a
 * person does at the bench comes through here.
 */
export async function recordEntry<K extends EntryKind>(
  db: AccountDatabase,
  buildId: string,
  kind: K,
  parts: { target: EntryTarget<K>; value: EntryValueInput<K> },
  beside?: Beside,
): Promise<Saved> {
  const entryId = v7();
  return durably<Saved>(db, () =>
    db.transaction('rw', [db.builds, db.entries, db.facts, ...(beside?.tables ?? [])], async (): Promise<Saved> => {
      if (await db.entries.get(entryId)) return { ok: true, entryId };
      const build = await db.builds.get(buildId);
      if (!build) return noBuild;
      if (build.role === 'onlooker') return onlooker;
      const madeAt = db.clock();
      const made = makeEntry(kind, {
        id: entryId,
        buildId,
        deviceId: db.deviceId,
        madeAt,
        seen: build.cursor,
        ...parts,
      });
      if (!made.ok) return { ok: false, code: 'invalid', message: `Not saved. ${made.message}` };
      const status = (await db.facts.get('syncStatus'))?.value as SyncStatus | undefined;
      const stamp = estimateStamp({
        madeAt,
        clockOffsetMs: status?.clockOffsetMs ?? 0,
        seenStamp: build.greatestStamp,
        previousStamp: null,
      });
      const standing = { ...made.entry, accountId: db.accountId, stamp, position: null } as unknown as StandingEntry;
      await db.entries.add({ ...standing, sync: 'held' });
      await db.builds.update(buildId, {
        state: applyEntries(build.state, [standing]),
        greatestStamp: Math.max(stamp, build.greatestStamp ?? stamp),
        lastUsedAt: madeAt,
      });
      await beside?.write();
      return { ok: true, entryId };
    }),
  );
}

const noBuild: NotSaved = {
  ok: false,
  code: 'no-build',
  message: 'Not saved: this build is not on this phone. Take it to the bench first.',
};
const onlooker: NotSaved = {
  ok: false,
  code: 'not-yours',
  message: 'You look on at this build and change nothing. Its owner can make you a helper.',
};
