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
  const planned = [...boards].sort(compareBoards).map((board): PlannedBoard => {
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

/** Same kind together, then those that begin with the longest parts. */
function compareBoards(a: FilledBoard, b: FilledBoard): number {
  if (a.kind !== b.kind) return a.kind - b.kind;
  for (let s = 0; s < a.contents.length; s++)
    for (let i = 0; i < a.contents[s]!.length; i++) {
      const difference = b.contents[s]![i]! - a.contents[s]![i]!;
      if (difference !== 0) return difference;
    }
  return 0;
}
