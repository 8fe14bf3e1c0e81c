import type { BoardPart, BoardRequest, BoardStock } from './request';
import { clearStretches, keepKerfBetween, type ClearStretch } from './clear-stretches';

/** One clear stretch of a kind of board; a board without defects has one. */
export interface Slot {
  kind: number;
  stretch: ClearStretch;
  /** In steps, with the kerf that the last part in it need not lose. */
  room: number;
  /** The same before neighbours were kept a kerf apart: never smaller, used for bounds only. */
  boundRoom: number;
}

/** One stock row as the search sees it. */
export interface BoardKind {
  stock: BoardStock;
  /** Numbers of its clear stretches in {@link PackingProblem.slots}, in order along the board. */
  slots: number[];
  /** Cost in {@link PackingProblem.costUnit}. */
  cost: number;
  /** How many may be used: what is available, at most one for each piece. */
  limit: number;
  /** Only so many exist; one that is not used stays in the rack. */
  limited: boolean;
}

/**
 * The request as whole-number packing: every part and every clear stretch carries one kerf, which makes n parts and
 * n - 1 kerfs fit exactly where they must. Equal lengths are one width; widths descend. A step is the largest length
 * that divides every width, so room is rounded down to steps without loss.
 */
export interface PackingProblem {
  step: number;
  kerf: number;
  keepOffcut: number;
  widths: number[];
  demands: number[];
  /** The parts of each width, in the order of the request. */
  parts: BoardPart[][];
  kinds: BoardKind[];
  slots: Slot[];
  /** Largest amount that divides the cost of every kind; costs of plans are its multiples. */
  costUnit: number;
  pieces: number;
}

/** The length that a part takes on a board: its own, or what is kept for it until it is measured. */
export function lengthTaken(part: BoardPart): number {
  return part.reserve ?? part.length;
}

/**
 * @param parts those that fit at least one kind; see {@link longestRoom}
 */
export function packingProblem(request: BoardRequest, parts: BoardPart[]): PackingProblem {
  const { kerf, trimStart = 0, trimEnd = 0, keepOffcut = 0 } = request;
  const byWidth = new Map<number, BoardPart[]>();
  for (const part of parts) {
    if (part.quantity === 0) continue;
    const width = lengthTaken(part) + kerf;
    const same = byWidth.get(width);
    if (same) same.push(part);
    else byWidth.set(width, [part]);
  }
  const rows = [...byWidth].sort(([a], [b]) => b - a);
  const step = rows.reduce((divisor, [width]) => greatestCommonDivisor(divisor, width), 0) || 1;
  const demands = rows.map(([, same]) => same.reduce((sum, part) => sum + part.quantity, 0));
  const pieces = demands.reduce((sum, demand) => sum + demand, 0);
  const shortest = (rows.at(-1)?.[0] ?? kerf + 1) - kerf;
  const isPriced = request.stock.some(({ price }) => price !== undefined);
  const costOf = (stock: BoardStock) => (isPriced ? (stock.price ?? 0) : stock.length);
  const room = ({ start, end }: ClearStretch) => (end > start ? Math.floor((end - start + kerf) / step) : 0);
  const kinds: BoardKind[] = [];
  const slots: Slot[] = [];
  for (const stock of request.stock) {
    const clear = clearStretches(stock, trimStart, trimEnd, shortest);
    if (clear.length === 0 || stock.available === 0) continue;
    const stretches = keepKerfBetween(clear, kerf);
    kinds.push({
      stock,
      slots: stretches.map((stretch, s) => {
        const slot = { kind: kinds.length, stretch, room: room(stretch), boundRoom: room(clear[s]!) };
        return slots.push(slot) - 1;
      }),
      cost: costOf(stock),
      limit: Math.min(stock.available ?? pieces, pieces),
      limited: stock.available !== undefined,
    });
  }
  const costUnit = kinds.reduce((divisor, { cost }) => greatestCommonDivisor(divisor, cost), 0) || 1;
  for (const kind of kinds) kind.cost /= costUnit;
  return {
    step,
    kerf,
    keepOffcut,
    widths: rows.map(([width]) => width / step),
    demands,
    parts: rows.map(([, same]) => same),
    kinds,
    slots,
    costUnit,
    pieces,
  };
}

function greatestCommonDivisor(a: number, b: number): number {
  while (b !== 0) [a, b] = [b, a % b];
  return a;
}
