import { MAX_LENGTH } from '@/lib/domain/measure';
import { CuttingRequestError } from '../request-error';
import type { BoardPart, BoardRequest, BoardStock } from './request';

/** More pieces than this in one request is a slip of the keyboard, not a job. */
const MAX_PIECES = 1_000_000;
/** Sums of prices stay exact whole numbers below this. */
const MAX_PRICE = 1_000_000_000;

/**
 * Refuses a request that makes no sense, before any planning.
 *
 * @throws CuttingRequestError naming the first thing that is wrong, in a sentence for the person
 */
export function checkBoardRequest(request: BoardRequest): void {
  const { kerf, trimStart = 0, trimEnd = 0, keepOffcut = 0, timeLimitMs = 0, seed = 0 } = request;
  requireLength(kerf, 'The kerf');
  requireLength(trimStart, 'The trim at the start of a board');
  requireLength(trimEnd, 'The trim at the end of a board');
  requireLength(keepOffcut, 'The shortest offcut to keep');
  if (!(timeLimitMs >= 0)) refuse('The time limit must be zero or more milliseconds.');
  if (!Number.isInteger(seed)) refuse('The seed must be a whole number.');
  requireOwnIds(request.stock, 'boards');
  requireOwnIds(request.parts, 'parts');
  request.stock.forEach(checkStock);
  request.parts.forEach(checkPart);
  const pieces = request.parts.reduce((sum, part) => sum + part.quantity, 0);
  if (pieces > MAX_PIECES) refuse('There are more than a million pieces in this list. Check the quantities.');
  const longest = request.stock.reduce((most, { length }) => Math.max(most, length), 0);
  if (longest > 0 && kerf >= longest)
    refuse('The kerf is as wide as the longest board is long. Check the kerf and its unit.');
}

function checkStock(stock: BoardStock): void {
  const named = `Board “${stock.id}”`;
  requireSize(stock.length, named);
  const { available, price } = stock;
  if (available !== undefined && !(Number.isInteger(available) && available >= 0))
    refuse(`${named} needs a whole number of pieces available, zero or more.`);
  if (price !== undefined && !(Number.isInteger(price) && price >= 0 && price <= MAX_PRICE))
    refuse(`${named} needs a price that is zero or more, in whole minor units.`);
  for (const { start, end } of stock.avoid ?? [])
    if (!(Number.isInteger(start) && Number.isInteger(end) && start >= 0 && end > start && end <= stock.length))
      refuse(`A stretch to avoid on board “${stock.id}” must end after it starts and lie on the board.`);
}

function checkPart(part: BoardPart): void {
  const named = `Part “${part.id}”`;
  requireSize(part.length, named);
  if (part.reserve !== undefined) requireSize(part.reserve, `The length kept for part “${part.id}”`);
  if (!(Number.isInteger(part.quantity) && part.quantity >= 0))
    refuse(`${named} needs a whole number of pieces, zero or more.`);
}

function requireOwnIds(rows: { id: string }[], what: string): void {
  const seen = new Set<string>();
  for (const { id } of rows) {
    if (seen.has(id)) refuse(`Two ${what} are both called “${id}”. Give each its own name.`);
    seen.add(id);
  }
}

function requireSize(value: number, named: string): void {
  if (!(Number.isInteger(value) && value > 0 && value <= MAX_LENGTH))
    refuse(`${named} needs a length above zero, in whole units, and at most 100 m.`);
}

function requireLength(value: number, named: string): void {
  if (!(Number.isInteger(value) && value >= 0 && value <= MAX_LENGTH))
    refuse(`${named} must be zero or more, in whole units, and at most 100 m.`);
}

function refuse(sentence: string): never {
  throw new CuttingRequestError(sentence);
}
