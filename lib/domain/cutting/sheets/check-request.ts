import { MAX_LENGTH } from '@/lib/domain/measure';
import { CuttingRequestError } from '../request-error';
import type { SheetPart, SheetRequest, SheetStock } from './request';

const MAX_PIECES = 100_000;
const MAX_PRICE = 1_000_000_000;

/**
 * Refuses a request that makes no sense, before any planning.
 *
 * @throws CuttingRequestError naming the first thing that is wrong, in a sentence for the person
 */
export function checkSheetRequest(request: SheetRequest): void {
  const { kerf, trim = 0, keepOffcut, stages = 3, timeLimitMs = 0, seed = 0 } = request;
  if (!isLength(kerf)) refuse('The kerf must be zero or more, in whole units, and at most 100 m.');
  if (!isLength(trim)) refuse('The trim must be zero or more, in whole units, and at most 100 m.');
  if (keepOffcut && !(isLength(keepOffcut.length) && isLength(keepOffcut.width)))
    refuse('The least offcut to keep needs a length and a width of zero or more, in whole units.');
  if (![2, 3, 4].includes(stages)) refuse('The number of stages must be 2, 3 or 4.');
  if (!(timeLimitMs >= 0)) refuse('The time limit must be zero or more milliseconds.');
  if (!Number.isInteger(seed)) refuse('The seed must be a whole number.');
  requireOwnIds(request.sheets, 'sheets');
  requireOwnIds(request.parts, 'parts');
  request.sheets.forEach(checkSheet);
  request.parts.forEach(checkPart);
  if (request.parts.reduce((sum, { quantity }) => sum + quantity, 0) > MAX_PIECES)
    refuse('There are more than a hundred thousand pieces in this list. Check the quantities.');
  const widest = request.sheets.reduce((most, { length, width }) => Math.max(most, Math.min(length, width)), 0);
  if (widest > 0 && kerf >= widest) refuse('The kerf is as wide as the widest sheet. Check the kerf and its unit.');
}

function checkSheet({ id, length, width, available, price }: SheetStock): void {
  if (!isSize(length) || !isSize(width))
    refuse(`Sheet “${id}” needs a length and a width above zero, in whole units, and at most 100 m.`);
  if (available !== undefined && !(Number.isInteger(available) && available >= 0))
    refuse(`Sheet “${id}” needs a whole number of sheets available, zero or more.`);
  if (price !== undefined && !(Number.isInteger(price) && price >= 0 && price <= MAX_PRICE))
    refuse(`Sheet “${id}” needs a price that is zero or more, in whole minor units.`);
}

function checkPart({ id, length, width, quantity }: SheetPart): void {
  if (!isSize(length) || !isSize(width))
    refuse(`Part “${id}” needs a length and a width above zero, in whole units, and at most 100 m.`);
  if (!(Number.isInteger(quantity) && quantity >= 0))
    refuse(`Part “${id}” needs a whole number of pieces, zero or more.`);
}

function requireOwnIds(rows: readonly { id: string }[], what: string): void {
  const seen = new Set<string>();
  for (const { id } of rows) {
    if (seen.has(id)) refuse(`Two ${what} are both called “${id}”. Give each its own name.`);
    seen.add(id);
  }
}

const isLength = (value: number) => Number.isInteger(value) && value >= 0 && value <= MAX_LENGTH;
const isSize = (value: number) => isLength(value) && value > 0;

function refuse(sentence: string): never {
  throw new CuttingRequestError(sentence);
}
