import { UNITS_PER_INCH, type Length } from '@/lib/domain/measure';
import type { PlanStock } from '@/lib/domain/plan/document';
import type { ResolvedPart } from '@/lib/domain/plan/resolve-parts';
import type { BoardRequest, UnplacedPart } from './boards/request';
import type { SheetRequest } from './sheets/request';

/** What a workshop takes for granted when nothing else is said. */
export interface CuttingHabits {
  kerf: Length;
  /** Taken off both ends of a board to square it, the kerf included. */
  squareEnds: Length;
  /** Taken off the edges of a sheet, which are seldom clean. */
  sheetTrim: Length;
  /** Shortest piece of a board worth keeping. */
  keepLength: Length;
}

/** Kerf of a common circular blade, half an inch off each end, and a foot to keep: *common practice*. */
export const usualHabits: CuttingHabits = {
  kerf: UNITS_PER_INCH / 8,
  squareEnds: UNITS_PER_INCH / 2,
  sheetTrim: 0,
  keepLength: 12 * UNITS_PER_INCH,
};

export interface CuttingJob {
  stock: PlanStock;
  request: { of: 'boards'; boards: BoardRequest } | { of: 'sheets'; sheets: SheetRequest };
  /** Parts whose size is still an estimate: room is kept for them, and they are not cut yet. */
  estimates: string[];
  /** Parts that this stock cannot give, with the reason. */
  unplaced: UnplacedPart[];
}

/**
 * One cutting job for each stock of a plan: its parts as they are first cut, allowances left on, from the lengths or
 * sheets that are sold. Parts made up from others are not cut. Boards whose parts are as wide as the stock are crosscut
 * alone; narrower parts are ripped, so each board is planned like a sheet with its grain along it.
 *
 * Prices count when every length of the stock has one. A board's by the foot, the metre or the board foot (nominal size
 * as given in the plan's thickness and width) is worked out for each length and rounded to whole minor units.
 */
export function cuttingJobs(
  stock: readonly PlanStock[],
  parts: Iterable<ResolvedPart>,
  habits: CuttingHabits = usualHabits,
): CuttingJob[] {
  const cut = [...parts].filter(({ part }) => !part.madeFrom);
  return stock.flatMap((each) => {
    const own = cut.filter(({ part }) => part.stock === each.id);
    return own.length > 0 ? [jobFor(each, own, habits)] : [];
  });
}

interface Piece {
  id: string;
  length: Length;
  width: Length;
  quantity: number;
  resolved: ResolvedPart;
}

function jobFor(stock: PlanStock, parts: readonly ResolvedPart[], habits: CuttingHabits): CuttingJob {
  const unplaced: UnplacedPart[] = [];
  const pieces = parts.flatMap((resolved): Piece[] => {
    const { part, length, width, thickness } = resolved;
    const tooThick = thickness + (part.rough?.thickness ?? 0) > stock.thickness && stock.kind === 'lumber';
    if (tooThick) {
      const reason = 'It is thicker than this stock. Glue it up from several pieces, or use thicker stock.';
      unplaced.push({ partId: part.id, quantity: part.quantity, reason });
      return [];
    }
    const rough = part.rough ?? {};
    return [
      {
        id: part.id,
        length: length + (rough.length ?? 0),
        width: width + (rough.width ?? 0),
        quantity: part.quantity,
        resolved,
      },
    ];
  });
  const estimates = pieces.filter(({ resolved }) => resolved.estimate).map(({ id }) => id);
  return { stock, request: requestFor(stock, pieces, habits), estimates, unplaced };
}

function requestFor(stock: PlanStock, pieces: readonly Piece[], habits: CuttingHabits): CuttingJob['request'] {
  const { kerf, squareEnds, sheetTrim, keepLength } = habits;
  if (stock.kind === 'sheet') {
    const sheet = { id: stock.id, length: stock.length, width: stock.width, grain: stock.grain };
    const price = stock.price?.amount.minor;
    return {
      of: 'sheets',
      sheets: {
        sheets: [price === undefined ? sheet : { ...sheet, price }],
        parts: pieces.map(sheetPart),
        kerf,
        trim: sheetTrim,
        keepOffcut: { length: keepLength, width: keepLength / 2 },
      },
    };
  }
  const sold = stock.lengthsSold.map((length) => {
    const price = boardPrice(stock, length);
    return { id: String(length), length, ...(price === null ? {} : { price }) };
  });
  if (pieces.every(({ width }) => width === stock.width)) {
    const parts = pieces.map(({ id, length, quantity, resolved }) =>
      resolved.estimate ? { id, length, quantity, reserve: length } : { id, length, quantity },
    );
    return {
      of: 'boards',
      boards: { stock: sold, parts, kerf, trimStart: squareEnds, trimEnd: squareEnds, keepOffcut: keepLength },
    };
  }
  // The squared ends come off first, so a board is that much shorter when it is ripped.
  const boards = sold
    .filter(({ length }) => length > 2 * squareEnds)
    .map((board) => ({ ...board, length: board.length - 2 * squareEnds, width: stock.width, grain: true }));
  return {
    of: 'sheets',
    sheets: {
      sheets: boards,
      parts: pieces.map((piece) => ({ ...sheetPart(piece), grain: 'along' as const })),
      kerf,
      keepOffcut: { length: keepLength, width: UNITS_PER_INCH },
    },
  };
}

function sheetPart({ id, length, width, quantity, resolved }: Piece) {
  const { grain, matched } = resolved.part;
  return { id, length, width, quantity, grain, ...(matched === undefined ? {} : { matched }) };
}

const FOOT = 12 * UNITS_PER_INCH;
const METRE = 640_000;

/** Price of one board of this length in minor units, halves up; null where the plan gives none. */
function boardPrice(stock: PlanStock & { kind: 'lumber' }, length: Length): number | null {
  if (!stock.price) return null;
  const { per, amount } = stock.price;
  if (per === 'piece') return amount.minor;
  if (per === 'foot') return Math.round((amount.minor * length) / FOOT);
  if (per === 'metre') return Math.round((amount.minor * length) / METRE);
  // A board foot is 144 cubic inches: a square foot, one inch thick.
  const boardFeet = (length * stock.width * stock.thickness) / (144 * UNITS_PER_INCH ** 3);
  return Math.round(amount.minor * boardFeet);
}
