import type { BoardPart, BoardRequest, BoardStock } from '@/lib/domain/cutting';
import { seededRandom } from '@/lib/domain/cutting/seeded-random';
import { UNITS_PER_INCH } from '@/lib/domain/measure';

/**
 * Five hundred cut lists as a workshop has them, and the stock to cut them from. Written before the planner was tuned
 * and not changed since: a changed list would make earlier figures worthless.
 *
 * 10 to 60 parts of 3 to 15 lengths on sixteenths of an inch, from 8 in to half the shortest stock or to 90 in; kerf 1/8 in.
 */
export const LIST_COUNT = 500;

const KERF = UNITS_PER_INCH / 8;
const SIXTEENTH = UNITS_PER_INCH / 16;
const STOCK_INCHES = [96, 120, 144, 192];

export interface WorkshopList {
  name: string;
  request: BoardRequest;
}

/** Each list with one length of stock, 96 to 192 in. */
export function oneLengthLists(): WorkshopList[] {
  return Array.from({ length: LIST_COUNT }, (_, n) => {
    const random = seededRandom(10_000 + n);
    const stock = STOCK_INCHES[between(random, 0, STOCK_INCHES.length - 1)]!;
    const longest = n % 2 === 0 ? Math.min(90, stock) : stock / 2;
    return {
      name: `one ${n}`,
      request: { stock: [board(stock)], parts: partsOf(random, longest), kerf: KERF },
    };
  });
}

/**
 * Each list with all four lengths: by length alone, dearer per foot the longer they are, or each at a price of its own.
 * Prices are in cents.
 */
export function severalLengthsLists(): WorkshopList[] {
  return Array.from({ length: LIST_COUNT }, (_, n) => {
    const random = seededRandom(20_000 + n);
    const parts = partsOf(random, n % 2 === 0 ? 90 : 48);
    const perFoot = between(random, 60, 250);
    const stock = STOCK_INCHES.map((inches, i) => {
      if (n % 3 === 0) return board(inches);
      if (n % 3 === 1) return board(inches, Math.round((inches / 12) * perFoot * (1 + 0.06 * i)));
      return board(inches, Math.round((inches / 12) * perFoot * (0.85 + 0.3 * random())));
    });
    return { name: `several ${n}`, request: { stock, parts, kerf: KERF } };
  });
}

function board(inches: number, price?: number): BoardStock {
  return { id: `${inches} in`, length: inches * UNITS_PER_INCH, ...(price === undefined ? {} : { price }) };
}

function partsOf(random: () => number, longestInches: number): BoardPart[] {
  const lengths = between(random, 3, 15);
  const pieces = Math.max(lengths, between(random, 10, 60));
  const parts = Array.from({ length: lengths }, (_, i) => ({
    id: `part ${i + 1}`,
    length: between(random, 8 * 16, longestInches * 16) * SIXTEENTH,
    quantity: 1,
  }));
  for (let piece = lengths; piece < pieces; piece++) parts[between(random, 0, lengths - 1)]!.quantity++;
  return parts;
}

/** A whole number from `least` to `most`, both included. */
function between(random: () => number, least: number, most: number): number {
  return least + Math.floor(random() * (most - least + 1));
}
