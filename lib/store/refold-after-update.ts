import type { Dexie, Table } from 'dexie';
import type { StandingEntry } from '../domain/build/entry';
import { entryVersionsKey } from '../domain/build/entry-versions';
import { foldEntries } from '../domain/build/fold';
import type { BuildRow, EntryRow, FactRow } from './rows';
import { durably } from './saved';

/** What of an account's database this needs; the database itself calls it when it opens. */
interface FoldedDatabase extends Dexie {
  builds: Table<BuildRow, string>;
  entries: Table<EntryRow, string>;
  facts: Table<FactRow, string>;
}

const FOLDED_WITH = 'foldedWith';

/**
 * S6: once after an update that knows other kinds or versions, folds every build anew from its entries, so that what
 * was parked counts and what was folded in an older shape has today's. Where the phone has no room for it the builds
 * stay as they are, and the next opening tries again.
 */
export async function refoldAfterUpdate(db: FoldedDatabase): Promise<void> {
  if ((await db.facts.get(FOLDED_WITH))?.value === entryVersionsKey) return;
  await durably(db, () =>
    db.transaction('rw', db.builds, db.entries, db.facts, async () => {
      for (const { id } of await db.builds.toArray()) {
        const rows = await db.entries.where('buildId').equals(id).toArray();
        const standing: StandingEntry[] = rows.filter(({ sync }) => sync !== 'refused');
        await db.builds.update(id, { state: foldEntries(standing) });
      }
      await db.facts.put({ key: FOLDED_WITH, value: entryVersionsKey });
    }),
  );
}
