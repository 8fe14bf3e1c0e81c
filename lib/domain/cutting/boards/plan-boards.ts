import { timeIsUp, type RunControl } from '../run-control';
import { checkBoardRequest } from './check-request';
import { clearStretches } from './clear-stretches';
import { findPacking } from './find-packing';
import { mostUseful } from './improve-offcuts';
import { layOut } from './lay-out';
import { lengthTaken, packingProblem, type PackingProblem } from './packing-problem';
import type { Packing } from './pattern';
import { possibleCosts } from './possible-costs';
import type { BoardPart, BoardPlan, BoardRequest, UnplacedPart } from './request';

const DEFAULT_LIMIT_MS = 1_000;

/**
 * Which boards to use and what to cut from each: least cost first (see {@link BoardRequest} for what cost is), then the
 * largest pieces left over, then parts of one length together.
 *
 * A kerf is lost at each cut and not at a board's untouched end: a part as long as the board needs no cut, and the kerf
 * of a last cut may run off the end. The same request and seed give the same plan whenever the run ends by proof.
 * Methods and their sources stand at the functions that do the work; see `findPacking`.
 *
 * @throws CuttingRequestError when the request makes no sense (a size of zero, a negative kerf)
 */
export function planBoards(request: BoardRequest, control: RunControl<BoardPlan> = {}): BoardPlan {
  checkBoardRequest(request);
  const isTimeUp = timeIsUp(request.timeLimitMs ?? DEFAULT_LIMIT_MS, control);
  const { fitting, unplaced } = sortOut(request);
  const problem = packingProblem(request, fitting);
  const toPlan = (packings: Packing[], lowerBound: number): BoardPlan => {
    const filled = mostUseful(problem, packings);
    const { boards, placed } = layOut(request, problem, filled);
    const cost = filled.reduce((sum, { kind }) => sum + problem.kinds[kind]!.cost, 0) * problem.costUnit;
    const left = fitting.flatMap((part) => leftOver(part, placed.get(part.id) ?? 0));
    return {
      boards,
      unplaced: [...unplaced, ...left],
      cost,
      lowerBound: lowerBound * problem.costUnit,
      proved: left.length === 0 && lowerBound * problem.costUnit === cost,
    };
  };
  const { onProgress } = control;
  const { best, ties, lowerBound } = findPacking(problem, request.seed ?? 1, isTimeUp, (better) =>
    onProgress?.(toPlan([better], 0)),
  );
  return toPlan([best, ...ties], best.missing === 0 ? lowerBound : boundOfPlaced(problem, best));
}

/** Parts that some board can hold, and why the others cannot be had. */
function sortOut(request: BoardRequest): { fitting: BoardPart[]; unplaced: UnplacedPart[] } {
  const { stock, trimStart = 0, trimEnd = 0 } = request;
  const had = stock.filter(({ available }) => available !== 0);
  const longest = had.reduce((most, { length }) => Math.max(most, length), 0);
  const longestClear = had
    .flatMap((board) => clearStretches(board, trimStart, trimEnd, 0))
    .reduce((most, { start, end }) => Math.max(most, end - start), 0);
  const fitting: BoardPart[] = [];
  const unplaced: UnplacedPart[] = [];
  for (const part of request.parts) {
    if (part.quantity === 0) continue;
    const length = lengthTaken(part);
    if (length <= longestClear) fitting.push(part);
    else unplaced.push({ partId: part.id, quantity: part.quantity, reason: whyNot(had.length, length > longest) });
  }
  return { fitting, unplaced };
}

function whyNot(boards: number, isTooLong: boolean): string {
  if (boards === 0) return 'There is no board to cut it from. Add stock.';
  return isTooLong
    ? 'It is longer than every board in the list. Add a longer board, or make the part in pieces.'
    : 'No board has a clear stretch this long once its ends are trimmed and its defects cut out. Add a longer board.';
}

function leftOver(part: BoardPart, placed: number): UnplacedPart[] {
  if (placed === part.quantity) return [];
  const reason = 'The boards in the list are used up. Add another board, or plan fewer pieces.';
  return [{ partId: part.id, quantity: part.quantity - placed, reason }];
}

/** Where stock ran out: what the placed pieces cost at least, by the room they need. */
function boundOfPlaced(problem: PackingProblem, best: Packing): number {
  const demands = problem.demands.map((_, i) =>
    best.uses.reduce((sum, { pattern, times }) => sum + times * pattern.counts[i]!, 0),
  );
  return Math.min(best.cost, possibleCosts({ ...problem, demands }, best.cost)(0));
}
