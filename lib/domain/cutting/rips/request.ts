import type { Length } from '@/lib/domain/measure';
import type { UnplacedPart } from '../boards/request';
import type { Cut, Placement, Rectangle } from '../sheets/request';

export interface RipStock {
  id: string;
  length: Length;
  width: Length;
  available?: number;
  /** Money for one board, in minor units. */
  price?: number;
}

export interface RipPart {
  id: string;
  length: Length;
  /** As it will be after the final rip. */
  width: Length;
  quantity: number;
}

/**
 * Lumber that is both ripped to width and crosscut to length. Grain runs along the board, so parts are never turned.
 * Lengths are whole units of 1/640 mm. Cost is money as soon as any board has a price, else the face area used.
 */
export interface RipRequest {
  boards: RipStock[];
  parts: RipPart[];
  ripKerf: Length;
  crosscutKerf: Length;
  /** Taken off both ends to square them, the kerf included. */
  squareEnds?: Length;
  /** Taken off both factory edges, which are eased round, the kerf included. */
  easedEdge?: Length;
  /**
   * Left on each part at the rough rip, for the rest that lets it move, the straightening and the final rip; their kerfs
   * included.
   */
  oversize?: Length;
  /** No part is ripped narrower than this at the rough rip: the person's own limit for the saw. */
  leastStrip?: Length;
  /** How far an edge bows away from straight over a length; grows with the square of the length. */
  crook?: { by: Length; over: Length };
  /** Rips this long are marked as ones that may close on the blade; 24 in when left out (*common practice*). */
  pinchLength?: Length;
  /** Least piece worth keeping, as it lies; any piece is when left out. */
  keepOffcut?: { length: Length; width: Length };
  /** Ends the search with the best plan so far; 1000 when left out. */
  timeLimitMs?: number;
  seed?: number;
}

/** One rip of a board: what it runs through, where its kerf begins, and what to beware of. */
export interface Rip {
  region: Rectangle;
  at: Length;
  /** Long enough for the wood to close on the blade as tension in it is let go. */
  mayPinch: boolean;
  /** What comes off beside the part is narrower than the person's limit: it is the off side, never the fence side. */
  leavesSliver: boolean;
}

export interface RippedBoard {
  boardId: string;
  /** What is left once ends are squared and edges taken off and straightened; the cuts begin with it. */
  usable: Rectangle;
  cuts: Cut;
  /** Where each part lies at its rough width. */
  placements: Placement[];
  rips: Rip[];
  /** Pieces worth keeping, the largest first. */
  offcuts: Rectangle[];
}

export interface RipPlan {
  /** Crosscut first where shorter pieces, which are straighter, save width or cost no more. */
  order: 'crosscut-first' | 'rip-first';
  /** Width set aside on every board for straightening an edge. */
  straighten: Length;
  boards: RippedBoard[];
  unplaced: UnplacedPart[];
  cost: number;
  /** No plan for the placed parts costs less, in whichever order. */
  lowerBound: number;
  proved: boolean;
}
