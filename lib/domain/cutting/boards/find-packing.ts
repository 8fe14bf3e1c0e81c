import { seededRandom } from '../seeded-random';
import type { TimeIsUp } from '../run-control';
import { branch, patternsWithinGap } from './branch-patterns';
import { Incumbent } from './incumbent';
import type { PackingProblem } from './packing-problem';
import type { Packing } from './pattern';
import { PatternLp } from './pattern-lp';
import { dive } from './pattern-search';
import { possibleCosts } from './possible-costs';
import { quickPacking } from './quick-packing';
import { SequentialValues } from './sequential-values';

/** Different widths up to which the relaxation is worked out; its basis grows with their square. */
const MAX_LP_WIDTHS = 700;
const FIRST_ROUNDS = 16;
const MAX_PATTERNS = 12_000;
const FIRST_NODES = 400;

/**
 * The cheapest packing that the time allows, with its bound: quick filling, sequential value correction, then the pattern
 * relaxation for the bound, and dives, branch and bound over the patterns within the gap and more corrected rounds in
 * turn until the bound is met. How much each does is counted, not timed, so that a run that ends by proof is repeatable.
 */
export function findPacking(
  problem: PackingProblem,
  seed: number,
  isTimeUp: TimeIsUp,
  onBetter: (best: Packing) => void,
): Incumbent {
  const random = seededRandom(seed);
  const first = quickPacking(problem, isTimeUp);
  const incumbent = new Incumbent(problem, first, onBetter);
  onBetter(first);
  if (first.missing === 0) incumbent.roundUp = possibleCosts(problem, first.cost);
  incumbent.raiseBound(0);
  const isOver = () => incumbent.isProved || isTimeUp();
  if (isOver()) return incumbent;
  const values = new SequentialValues(problem, random);
  const roundsOf = (count: number) => {
    for (let n = 0; n < count && !isOver(); n++) {
      const { missing, cost } = incumbent.best;
      const found = values.round([], missing > 0 ? Infinity : cost, isTimeUp);
      if (found) incumbent.offer(found.uses);
    }
  };
  roundsOf(FIRST_ROUNDS);
  if (isOver()) return incumbent;
  if (problem.widths.length > MAX_LP_WIDTHS) {
    while (!isOver()) roundsOf(FIRST_ROUNDS);
    return incumbent;
  }
  const relaxation = new PatternLp(problem, mostBoards(incumbent));
  relaxation.addAll(incumbent.best.uses);
  const isPriced = relaxation.generate(Int32Array.from(problem.demands), true, incumbent.roundUp, isTimeUp);
  incumbent.raiseBound(relaxation.rootDuals.bound);
  let all: PatternLp | undefined;
  let allFor = Infinity;
  for (let turn = 0; !isOver(); turn++) {
    dive(relaxation, incumbent, turn === 0 ? 0 : 0.4, random, isTimeUp);
    if (isOver()) break;
    if (isPriced && incumbent.best.missing === 0) {
      if (incumbent.best.cost < allFor) {
        allFor = incumbent.best.cost;
        all = patternsWithinGap(relaxation, incumbent, MAX_PATTERNS);
      }
      if (all && branch(all, incumbent, FIRST_NODES * 2 ** turn, isOver) === 'searched')
        incumbent.raiseBound(incumbent.best.cost);
    }
    values.startFrom(relaxation.worths());
    roundsOf(FIRST_ROUNDS * 2);
  }
  return incumbent;
}

function mostBoards({ problem, best }: Incumbent): Int32Array {
  return Int32Array.from(problem.kinds, ({ cost, limit }) =>
    best.missing > 0 || cost === 0 ? limit : Math.min(limit, Math.floor(best.cost / cost)),
  );
}
