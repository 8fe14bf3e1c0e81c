import type { AccountDatabase } from '../database';
import { durably, type NotSaved } from '../saved';

/** Keeps words as they are typed, so that a reload or a dead battery loses none. An empty draft is taken away. */
export function saveDraft(db: AccountDatabase, key: string, text: string): Promise<void | NotSaved> {
  return durably(db, () =>
    db.transaction('rw', db.drafts, async () => {
      if (text === '') await db.drafts.delete(key);
      else await db.drafts.put({ key, text, savedAt: db.clock() });
    }),
  );
}

export const clearDraft = (db: AccountDatabase, key: string) => saveDraft(db, key, '');
