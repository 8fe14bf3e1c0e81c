import type { Length } from '@/lib/domain/measure';
import { clearStretches } from './clear-stretches';
import type { BoardCut, BoardRequest, BoardStock } from './request';

/**
 * The longest piece without defects that a board still yields beside its cuts: a kerf off where it met a part, the trim
 * off at the ends, none where it meets a defect or runs to the trimmed end. 0 when nothing is left.
 */
export function longestClearPiece(request: BoardRequest, stock: BoardStock, cuts: readonly BoardCut[]): Length {
  const { kerf, trimStart = 0, trimEnd = 0 } = request;
  const along = [...cuts].sort((a, b) => a.start - b.start);
  const stretches = clearStretches(stock, trimStart, trimEnd, 0);
  let longest = 0;
  for (let gap = 0; gap <= along.length; gap++) {
    const from = gap === 0 ? 0 : along[gap - 1]!.end + kerf;
    const to = gap === along.length ? stock.length : along[gap]!.start - kerf;
    for (const { start, end } of stretches) longest = Math.max(longest, Math.min(end, to) - Math.max(start, from));
  }
  return longest;
}
