import type { RunControl } from '../run-control';
import { CuttingRequestError } from '../request-error';
import { planBoards } from './plan-boards';
import type { BoardCut, BoardPlan, BoardRequest, BoardStock, PlannedBoard } from './request';

/** Work that is under way: what was asked for, what has been cut, and what there really is to go on with. */
export interface BoardsUnderWay {
  /** The request as it was planned; its `stock` is not looked at any more. */
  request: BoardRequest;
  /** Boards that have been begun, with only the cuts that are made and good. */
  begun: PlannedBoard[];
  /** What is left to cut from: whole boards, offcuts, remainders of begun boards (see {@link remainderOf}), what the yard sells. */
  stock: BoardStock[];
}

export interface BoardReplan {
  /** The begun boards, exactly as they were given. */
  begun: PlannedBoard[];
  /** A plan for the parts not cut yet; its cost and bound are those of the rest alone. */
  rest: BoardPlan;
}

/**
 * Plans the rest when a cut went wrong or the stock is not what was planned on. A part that is cut stays where it is and
 * is never asked for again; a spoilt piece is simply not among the cuts, so it is planned anew.
 *
 * @throws CuttingRequestError when a made cut belongs to no part of the request, or as {@link planBoards} does
 */
export function replanBoards(underWay: BoardsUnderWay, control?: RunControl<BoardPlan>): BoardReplan {
  const { request, begun, stock } = underWay;
  const made = new Map<string, number>();
  for (const { partId } of begun.flatMap(({ cuts }) => cuts)) made.set(partId, (made.get(partId) ?? 0) + 1);
  const known = new Set(request.parts.map(({ id }) => id));
  for (const partId of made.keys())
    if (!known.has(partId))
      throw new CuttingRequestError(`“${partId}” is cut but is not in the cut list. Add it, or take the cut back.`);
  const parts = request.parts.map((part) => ({
    ...part,
    quantity: Math.max(0, part.quantity - (made.get(part.id) ?? 0)),
  }));
  return { begun, rest: planBoards({ ...request, stock, parts }, control) };
}

/**
 * What is left of a board after cuts made from its start, as stock to plan on: from one kerf past the last cut to the
 * board's end, its defects with it. It is already paid for. The fresh end is trimmed again like any other, which may
 * cost the trim but never gives too short a part.
 *
 * @returns undefined when nothing is left
 */
export function remainderOf(
  request: BoardRequest,
  stock: BoardStock,
  made: readonly BoardCut[],
): BoardStock | undefined {
  const from = made.reduce((end, cut) => Math.max(end, cut.end + request.kerf), 0);
  if (from >= stock.length) return undefined;
  const avoid = (stock.avoid ?? [])
    .filter(({ end }) => end > from)
    .map(({ start, end }) => ({ start: Math.max(0, start - from), end: end - from }));
  return {
    id: `${stock.id}, what is left`,
    length: stock.length - from,
    available: 1,
    ...(stock.price === undefined ? {} : { price: 0 }),
    ...(avoid.length > 0 ? { avoid } : {}),
  };
}
