import { v7 } from 'uuid';
import type { EntryValueInput } from '../../domain/build/kinds';
import type { AccountDatabase } from '../database';
import { recordEntry } from '../record-entry';
import type { Saved } from '../saved';

/** Keeps a note; its draft goes in the same transaction, so that the words are never in neither place. */
export function writeNote(
  db: AccountDatabase,
  { buildId, draftKey, ...value }: { buildId: string; draftKey?: string } & EntryValueInput<'note-written'>,
): Promise<Saved> {
  const beside = draftKey ? { tables: [db.drafts], write: () => db.drafts.delete(draftKey) } : undefined;
  return recordEntry(db, buildId, 'note-written', { target: { noteId: v7() }, value }, beside);
}

/** Changes a note; the old words stay in the log. */
export function reviseNote(
  db: AccountDatabase,
  { buildId, noteId, text, draftKey }: { buildId: string; noteId: string; text: string; draftKey?: string },
): Promise<Saved> {
  const beside = draftKey ? { tables: [db.drafts], write: () => db.drafts.delete(draftKey) } : undefined;
  return recordEntry(db, buildId, 'note-revised', { target: { noteId }, value: { text } }, beside);
}
