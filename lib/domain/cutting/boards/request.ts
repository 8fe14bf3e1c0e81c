import type { Length } from '@/lib/domain/measure';

/** A stretch of a board that no part may touch: a knot, a split, a snipe. Measured from the board's start. */
export interface AvoidedStretch {
  start: Length;
  end: Length;
}

export interface BoardStock {
  id: string;
  length: Length;
  /** How many there are; as many as needed when left out (a length the yard sells). */
  available?: number;
  /** Money for one, in minor units. See {@link BoardRequest} for what a missing price means. */
  price?: number;
  avoid?: AvoidedStretch[];
}

export interface BoardPart {
  id: string;
  length: Length;
  quantity: number;
  /** Not measured yet: this much is kept free for each piece, in place of `length`, and is not cut. */
  reserve?: Length;
}

/**
 * What to cut, and from what. Lengths are whole units of 1/640 mm.
 *
 * Cost is money as soon as any stock has a price; stock without one then counts as already paid for (0), as a rack
 * piece is. With no price anywhere, cost is the length of the stock used.
 */
export interface BoardRequest {
  stock: BoardStock[];
  parts: BoardPart[];
  /** Width of wood that one cut turns to dust. */
  kerf: Length;
  /** Taken off the start of each board to square it, its own kerf included. */
  trimStart?: Length;
  /** The same at the far end. */
  trimEnd?: Length;
  /** Shortest piece worth keeping; shorter leftovers count as waste. Any piece is worth keeping when left out. */
  keepOffcut?: Length;
  /** Ends the search with the best plan so far; 1000 when left out. */
  timeLimitMs?: number;
  /** Whole number that the random part of the search starts from; 1 when left out. */
  seed?: number;
}

/** Where a part lies on its board, measured from the board's start. */
export interface BoardCut {
  partId: string;
  start: Length;
  end: Length;
}

export interface PlannedBoard {
  stockId: string;
  /** In the order in which they lie, reserved stretches last within their clear stretch. */
  cuts: BoardCut[];
  /** The longest clear piece left, its own kerf and the end trim taken off; 0 when nothing is left. */
  offcut: Length;
}

export interface UnplacedPart {
  partId: string;
  quantity: number;
  /** A sentence for the person: why, and what would help. */
  reason: string;
}

export interface BoardPlan {
  boards: PlannedBoard[];
  unplaced: UnplacedPart[];
  cost: number;
  /** No plan for the placed parts costs less than this. */
  lowerBound: number;
  /** True only when `cost` equals `lowerBound` and every part that fits a board has its place. */
  proved: boolean;
}
