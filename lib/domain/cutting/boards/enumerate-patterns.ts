import type { PackingProblem } from './packing-problem';
import type { Pattern } from './pattern';

const MAX_STEPS = 1_500_000;

/**
 * Every full pattern of a slot that is worth at least `least` and that the demand allows; a pattern is full when
 * nothing more that is wanted fits. A plan can always be made of full patterns, so these are all that matter.
 *
 * @returns undefined when there are more than `most`, or finding them takes too long
 */
export function enumeratePatterns(
  problem: PackingProblem,
  slot: number,
  worths: Float64Array,
  least: number,
  most: number,
): Pattern[] | undefined {
  const { widths, demands, slots } = problem;
  const order = Array.from(widths.keys()).sort((a, b) => worths[b]! / widths[b]! - worths[a]! / widths[a]! || a - b);
  const shortestFrom = new Float64Array(order.length + 1).fill(Infinity);
  for (let at = order.length - 1; at >= 0; at--)
    shortestFrom[at] = Math.min(shortestFrom[at + 1]!, widths[order[at]!]!);
  const counts = new Int32Array(widths.length);
  const patterns: Pattern[] = [];
  let steps = 0;
  const isFull = (left: number) => {
    for (let i = widths.length - 1; i >= 0 && widths[i]! <= left; i--) if (counts[i]! < demands[i]!) return false;
    return true;
  };
  /** False when the limits were passed. */
  const visit = (from: number, left: number, value: number): boolean => {
    if (++steps > MAX_STEPS) return false;
    if (value >= least && isFull(left)) {
      if (patterns.length === most) return false;
      patterns.push({ slot, counts: counts.slice() });
    }
    for (let at = from; at < order.length && shortestFrom[at]! <= left; at++) {
      const i = order[at]!;
      const width = widths[i]!;
      if (width > left) continue;
      if (value + (worths[i]! * left) / width < least) return true;
      for (let count = Math.min(demands[i]!, Math.floor(left / width)); count > 0; count--) {
        counts[i] = count;
        if (!visit(at + 1, left - count * width, value + count * worths[i]!)) return false;
      }
      counts[i] = 0;
    }
    return true;
  };
  return visit(0, slots[slot]!.room, 0) ? patterns : undefined;
}
