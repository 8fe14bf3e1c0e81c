import { longestClearPiece } from './clear-piece';
import type { BoardPlan, BoardRequest, PlannedBoard } from './request';

/**
 * Checks a plan against its request from nothing but the two: lengths, kerf, trims, defects, quantities, stock on hand,
 * cost, bound and the word "proved".
 *
 * @returns one plain line for each thing that is wrong; empty when the plan can be cut
 */
export function checkBoardPlan(request: BoardRequest, plan: BoardPlan): string[] {
  const wrong: string[] = [];
  plan.boards.forEach((board, n) => {
    for (const line of checkBoard(request, board)) wrong.push(`Board ${n + 1}: ${line}`);
  });
  wrong.push(...checkQuantities(request, plan), ...checkStock(request, plan));
  const isPriced = request.stock.some(({ price }) => price !== undefined);
  const costs = new Map(request.stock.map(({ id, price, length }) => [id, isPriced ? (price ?? 0) : length]));
  const cost = plan.boards.reduce((sum, { stockId }) => sum + (costs.get(stockId) ?? 0), 0);
  if (plan.cost !== cost) wrong.push(`The cost is ${cost}, not ${plan.cost}.`);
  if (plan.lowerBound > plan.cost) wrong.push('The lower bound is above the cost.');
  if (plan.proved && plan.lowerBound !== plan.cost) wrong.push('Proved, but the cost is not the lower bound.');
  return wrong;
}

function checkBoard(request: BoardRequest, board: PlannedBoard): string[] {
  const { kerf, trimStart = 0, trimEnd = 0 } = request;
  const stock = request.stock.find(({ id }) => id === board.stockId);
  if (!stock) return [`there is no stock “${board.stockId}”.`];
  const wrong: string[] = [];
  if (board.cuts.length === 0) wrong.push('nothing is cut from it.');
  const along = [...board.cuts].sort((a, b) => a.start - b.start);
  along.forEach((cut, i) => {
    const part = request.parts.find(({ id }) => id === cut.partId);
    if (!part) return void wrong.push(`there is no part “${cut.partId}”.`);
    if (cut.end - cut.start !== (part.reserve ?? part.length)) wrong.push(`“${cut.partId}” has the wrong length.`);
    if (cut.start < trimStart || cut.end > stock.length - trimEnd) wrong.push(`“${cut.partId}” leaves the board.`);
    if (stock.avoid?.some(({ start, end }) => cut.start < end && cut.end > start))
      wrong.push(`“${cut.partId}” lies on a stretch to avoid.`);
    const next = along[i + 1];
    if (next && next.start < cut.end + kerf) wrong.push(`no kerf between “${cut.partId}” and “${next.partId}”.`);
  });
  const offcut = longestClearPiece(request, stock, board.cuts);
  if (board.offcut !== offcut) wrong.push(`the offcut is ${offcut}, not ${board.offcut}.`);
  return wrong;
}

function checkQuantities(request: BoardRequest, plan: BoardPlan): string[] {
  const counts = new Map<string, number>();
  const count = (id: string, quantity: number) => counts.set(id, (counts.get(id) ?? 0) + quantity);
  for (const { cuts } of plan.boards) for (const { partId } of cuts) count(partId, 1);
  for (const { partId, quantity } of plan.unplaced) count(partId, quantity);
  return request.parts
    .filter(({ id, quantity }) => (counts.get(id) ?? 0) !== quantity)
    .map(({ id, quantity }) => `“${id}” is wanted ${quantity} times and comes ${counts.get(id) ?? 0} times.`);
}

function checkStock(request: BoardRequest, plan: BoardPlan): string[] {
  return request.stock
    .filter(({ id, available = Infinity }) => plan.boards.filter(({ stockId }) => stockId === id).length > available)
    .map(({ id }) => `More of “${id}” is used than there is.`);
}
