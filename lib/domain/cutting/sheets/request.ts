import type { Length } from '@/lib/domain/measure';
import type { UnplacedPart } from '../boards/request';

export interface SheetStock {
  id: string;
  /** Along x, which is the way the sheet's grain runs. */
  length: Length;
  width: Length;
  /** How many there are; as many as needed when left out. */
  available?: number;
  /** Money for one, in minor units. */
  price?: number;
  /** False for a sheet without grain, on which any part may be turned. Left out, the parts' own wishes hold. */
  grain?: boolean;
}

/** How a part's length lies on the sheet: with the grain, square to it, or as it fits. */
export type GrainWish = 'along' | 'across' | 'any';

export interface SheetPart {
  id: string;
  length: Length;
  width: Length;
  quantity: number;
  /** `any` when left out. */
  grain?: GrainWish;
  /** Pieces of one group come side by side from one sheet, in the order of the list. */
  matched?: string;
}

/** Runs along x, or across it. */
export type CutDirection = 'along' | 'across';

/**
 * What to cut, and from which sheets. Lengths are whole units of 1/640 mm. All cuts run from edge to edge.
 *
 * Cost is money as soon as any sheet has a price; a sheet without one then counts as already paid for. With no price
 * anywhere, cost is the area of the sheets used, in square units.
 */
export interface SheetRequest {
  sheets: SheetStock[];
  parts: SheetPart[];
  kerf: Length;
  /** Taken off each edge of a sheet, its own kerf included. */
  trim?: Length;
  /**
   * How often the direction may change between the first cut and a part, the first cut counted; the last trim of a piece
   * to its size is not. 3 when left out.
   */
  stages?: 2 | 3 | 4;
  /**
   * `either` when left out. A strip as wide as the sheet needs no cut of its own: its sheet begins with the second stage.
   */
  firstCut?: CutDirection | 'either';
  /** Least piece worth keeping, either way round; any piece is when left out. */
  keepOffcut?: { length: Length; width: Length };
  /** Ends the search with the best plan so far; 1000 when left out. */
  timeLimitMs?: number;
  /** Whole number that the random part of the search starts from; 1 when left out. */
  seed?: number;
}

/** A rectangle of a sheet: x along its length, y across it, from its corner. */
export interface Rectangle {
  x: Length;
  y: Length;
  length: Length;
  width: Length;
}

/**
 * What is done with one rectangle of a sheet: cut through from edge to edge into two, or left as it is. Of a cut, `at` is
 * where its kerf begins: `first` lies before it, `rest` behind the kerf. Where the kerf runs off an edge there is nothing on
 * that side: null.
 */
export type Cut = Rectangle &
  (
    | { kind: 'cut'; direction: CutDirection; at: Length; first: Cut | null; rest: Cut | null }
    | { kind: 'part'; partId: string; turned: boolean }
    | { kind: 'offcut' }
    | { kind: 'waste' }
  );

export interface Placement extends Rectangle {
  partId: string;
  /** Its own width lies along x. */
  turned: boolean;
}

export interface PlannedSheet {
  sheetId: string;
  cuts: Cut;
  placements: Placement[];
  /** Pieces worth keeping, the largest first. */
  offcuts: Rectangle[];
}

export interface SheetPlan {
  sheets: PlannedSheet[];
  unplaced: UnplacedPart[];
  cost: number;
  /** No plan for the placed parts costs less than this, whatever the rule of cutting. */
  lowerBound: number;
  /** True only when `cost` equals `lowerBound` and every part that fits a sheet has its place. */
  proved: boolean;
}
