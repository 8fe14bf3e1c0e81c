import { ROUNDING_MARGIN } from './pattern-lp';
import type { PackingProblem } from './packing-problem';

/** Costs above this are not tabulated; bounds are then rounded to whole cost units only. */
const MAX_TABULATED = 400_000;

/** The least cost that a plan can have at or above a bound; both in cost units. */
export type RoundUp = (bound: number) => number;

/**
 * A plan costs a sum of board costs, and its boards must hold all the wood: the costs for which some such set of boards
 * exists are tabulated (a knapsack over cost, keeping the most room), so that a bound may be rounded up to the next.
 *
 * @param ceiling  cost of a known plan; no bound needs to go above it
 */
export function possibleCosts(problem: PackingProblem, ceiling: number): RoundUp {
  const upToUnit = (bound: number) => Math.max(0, Math.ceil(bound - ROUNDING_MARGIN));
  if (ceiling > MAX_TABULATED) return upToUnit;
  const needed = problem.widths.reduce((sum, width, i) => sum + width * problem.demands[i]!, 0);
  const room = new Float64Array(ceiling + 1).fill(-1);
  room[0] = 0;
  let free = 0;
  for (const { cost, limit, slots } of problem.kinds) {
    const each = slots.reduce((sum, slot) => sum + problem.slots[slot]!.boundRoom, 0);
    if (cost === 0) {
      free += limit * each;
      continue;
    }
    let left = Math.min(limit, Math.floor(ceiling / cost));
    for (let times = 1; left > 0; times *= 2) {
      const taken = Math.min(times, left);
      left -= taken;
      for (let sum = ceiling; sum >= taken * cost; sum--) {
        const before = room[sum - taken * cost]!;
        if (before >= 0) room[sum] = Math.max(room[sum]!, before + taken * each);
      }
    }
  }
  const next = new Float64Array(ceiling + 2).fill(ceiling);
  for (let sum = ceiling - 1; sum >= 0; sum--)
    next[sum] = room[sum]! >= 0 && room[sum]! + free >= needed ? sum : next[sum + 1]!;
  return (bound) => next[Math.min(ceiling, upToUnit(bound))]!;
}
