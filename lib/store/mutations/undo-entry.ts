import type { AccountDatabase } from '../database';
import { recordEntry } from '../record-entry';
import type { Saved } from '../saved';

/** Takes an entry back, or (undone: false) takes the undo back. */
export function undoEntry(
  db: AccountDatabase,
  { buildId, entryId, undone = true }: { buildId: string; entryId: string; undone?: boolean },
): Promise<Saved> {
  return recordEntry(db, buildId, 'entry-undone', { target: { entryId }, value: { undone } });
}
