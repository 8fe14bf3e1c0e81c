import { longestClearPiece } from './clear-piece';
import type { FilledBoard } from './improve-offcuts';
import type { PackingProblem } from './packing-problem';
import { lengthTaken } from './packing-problem';
import type { BoardCut, BoardPart, BoardRequest, PlannedBoard } from './request';

/**
 * Gives every piece its part and its place. Along a clear stretch parts lie longest first, equal parts together, those
 * kept for a later measurement last, next to the offcut. Boards of one pattern come one after the other.
 *
 * @returns the boards, and how many pieces of each part they hold
 */
export function layOut(
  request: BoardRequest,
  problem: PackingProblem,
  boards: FilledBoard[],
): { boards: PlannedBoard[]; placed: Map<string, number> } {
  const waiting = problem.parts.map((parts) =>
    [...parts]
      .sort((a, b) => Number(a.reserve !== undefined) - Number(b.reserve !== undefined))
      .map((part) => ({ part, left: part.quantity })),
  );
  const placed = new Map<string, number>();
  const takeParts = (i: number, count: number): BoardPart[] => {
    const taken: BoardPart[] = [];
    while (taken.length < count) {
      const [next] = waiting[i]!;
      if (!next) throw new Error('A plan holds more pieces than were asked for.');
      const now = Math.min(next.left, count - taken.length);
      for (let n = 0; n < now; n++) taken.push(next.part);
      placed.set(next.part.id, (placed.get(next.part.id) ?? 0) + now);
      next.left -= now;
      if (next.left === 0) waiting[i]!.shift();
    }
    return taken;
  };
  const planned = inCuttingOrder(boards).map((board): PlannedBoard => {
    const { stock, slots } = problem.kinds[board.kind]!;
    const cuts = board.contents.flatMap((counts, s): BoardCut[] => {
      let at = problem.slots[slots[s]!]!.stretch.start;
      const parts: BoardPart[] = [];
      for (let i = 0; i < counts.length; i++) if (counts[i]! > 0) parts.push(...takeParts(i, counts[i]!));
      parts.sort((a, b) => Number(a.reserve !== undefined) - Number(b.reserve !== undefined));
      return parts.map((part) => {
        const cut = { partId: part.id, start: at, end: at + lengthTaken(part) };
        at = cut.end + problem.kerf;
        return cut;
      });
    });
    return { stockId: stock.id, cuts, offcut: longestClearPiece(request, stock, cuts) };
  });
  return { boards: planned, placed };
}

/** Same kind together, then those that begin with the longest parts, then those with most of them. */
function inCuttingOrder(boards: FilledBoard[]): FilledBoard[] {
  const keyed = boards.map((board) => {
    const key = [board.kind];
    board.contents.forEach((counts, s) => {
      for (let i = 0; i < counts.length; i++) if (counts[i]! > 0) key.push(s * counts.length + i, -counts[i]!);
    });
    return { board, key };
  });
  return keyed.sort((a, b) => compareLists(a.key, b.key)).map(({ board }) => board);
}

/** The first difference decides; of two that agree as far as they go the longer comes first. */
function compareLists(a: number[], b: number[]): number {
  for (let k = 0; k < Math.min(a.length, b.length); k++) if (a[k] !== b[k]) return a[k]! - b[k]!;
  return b.length - a.length;
}
