import type { AccountDatabase } from '../database';
import { recordEntry } from '../record-entry';
import type { Saved } from '../saved';

/** Takes a key size from the work, or (null) sets it back to the plan. */
export function setKeySize(
  db: AccountDatabase,
  {
    buildId,
    keySizeId,
    stockPiece = null,
    length,
    how,
  }: { buildId: string; keySizeId: string; stockPiece?: string | null; length: number | null; how?: string },
): Promise<Saved> {
  return recordEntry(db, buildId, 'key-size-set', { target: { keySizeId, stockPiece }, value: { length, how } });
}
