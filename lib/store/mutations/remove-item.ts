import type { EntryTarget } from '../../domain/build/kinds';
import type { AccountDatabase } from '../database';
import { recordEntry } from '../record-entry';
import type { Saved } from '../saved';

/** Takes an item out of its collection, or (removed: false) puts it back. */
export function removeItem(
  db: AccountDatabase,
  { buildId, collection, itemId, removed = true }: { buildId: string; removed?: boolean } & EntryTarget<'item-removed'>,
): Promise<Saved> {
  return recordEntry(db, buildId, 'item-removed', { target: { collection, itemId }, value: { removed } });
}
