import type { Length } from '@/lib/domain/measure';
import type { Cut, CutDirection, Rectangle } from './request';

export interface OrderedCut {
  /** From 1. */
  number: number;
  direction: CutDirection;
  /** What the fence or the stop is set to: size of the piece that comes off. */
  setting: Length;
  /** The rectangle that is cut through. */
  region: Rectangle;
  /** Where the kerf begins, along y for a cut along and along x for one across. */
  at: Length;
}

/**
 * The cuts of a sheet in an order in which they can be made: a piece is cut off before it is itself cut up, and what lies
 * behind it waits until then.
 */
export function cutOrder(cuts: Cut): OrderedCut[] {
  const ordered: OrderedCut[] = [];
  const visit = (cut: Cut): void => {
    if (cut.kind !== 'cut') return;
    const { direction, at, x, y, length, width, first, rest } = cut;
    const setting = direction === 'along' ? at - y : at - x;
    ordered.push({ number: ordered.length + 1, direction, setting, region: { x, y, length, width }, at });
    if (first) visit(first);
    if (rest) visit(rest);
  };
  visit(cuts);
  return ordered;
}

/** Pieces of a sheet that are neither a part nor kept. */
export function wasteOf(cuts: Cut): Rectangle[] {
  if (cuts.kind === 'waste') return [cuts];
  if (cuts.kind !== 'cut') return [];
  return [...(cuts.first ? wasteOf(cuts.first) : []), ...(cuts.rest ? wasteOf(cuts.rest) : [])];
}
