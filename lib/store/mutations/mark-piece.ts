import type { AccountDatabase } from '../database';
import { recordEntry } from '../record-entry';
import type { Saved } from '../saved';

/** Ticks a piece of the cut list, or takes the tick back. */
export function markPiece(
  db: AccountDatabase,
  { buildId, partId, piece, mark }: { buildId: string; partId: string; piece: number; mark: 'cut' | 'open' },
): Promise<Saved> {
  return recordEntry(db, buildId, 'piece-marked', { target: { partId, piece }, value: { mark } });
}
