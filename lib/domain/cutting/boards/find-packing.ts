import { seededRandom } from '../seeded-random';
import type { TimeIsUp } from '../run-control';
import { Incumbent } from './incumbent';
import type { PackingProblem } from './packing-problem';
import type { Packing } from './pattern';
import { PatternLp } from './pattern-lp';
import { dive } from './pattern-search';
import { fillMix } from './fill-mix';
import { MixSearch } from './search-mixes';
import { limitsOf, quickPacking } from './quick-packing';
import { SequentialValues } from './sequential-values';

/** Different widths up to which the relaxation is worked out; its basis grows with their square. */
const MAX_LP_WIDTHS = 700;
const TIE_ROUNDS = 20;
/** Table cells filled at most for the sake of ties. */
const TIE_WORK = 20_000_000;
const FIRST_ROUNDS = 16;
/** Once it is known that the boards do not suffice, only so much is done to place as much as possible. */
const TURNS_WHEN_SHORT = 3;

/**
 * The cheapest packing that the time allows, with its bound, and others of the same cost. How much each method does is
 * counted, not timed, so that a run that ends by proof is repeatable.
 */
export function findPacking(
  problem: PackingProblem,
  seed: number,
  isTimeUp: TimeIsUp,
  onBetter: (best: Packing) => void,
): Incumbent {
  const incumbent = search(problem, seed, isTimeUp, onBetter);
  if (incumbent.isProved) collectTies(incumbent, seed);
  return incumbent;
}

/** A few more plans of the proved cost; little work, and as much of it whatever the clock says. */
function collectTies(incumbent: Incumbent, seed: number): void {
  const { problem, best } = incumbent;
  const largest = problem.slots.reduce((most, { room }) => Math.max(most, room), 0);
  const boards = best.boards.reduce((sum, count) => sum + count, 0);
  const rounds = Math.min(TIE_ROUNDS, Math.floor(TIE_WORK / (boards * problem.widths.length * largest + 1)));
  const values = new SequentialValues(problem, seededRandom(seed + 1));
  for (let n = 0; n < rounds; n++) {
    const found = values.round(best.cost, () => false);
    if (found) incumbent.offer(found.uses);
  }
}

/**
 * Quick filling, sequential value correction, then the pattern relaxation for the bound; after that dives, corrected
 * rounds and the mixes of boards between bound and cost in turn, until the two meet.
 */
function search(
  problem: PackingProblem,
  seed: number,
  isTimeUp: TimeIsUp,
  onBetter: (best: Packing) => void,
): Incumbent {
  const random = seededRandom(seed);
  const first = quickPacking(problem, isTimeUp);
  const incumbent = new Incumbent(problem, first, onBetter);
  onBetter(first);
  incumbent.raiseBound(0);
  const isOver = () => incumbent.isProved || isTimeUp();
  if (isOver()) return incumbent;
  const values = new SequentialValues(problem, random);
  const roundsOf = (count: number) => {
    for (let n = 0; n < count && !isOver(); n++) {
      const { missing, cost } = incumbent.best;
      const found = values.round(missing > 0 ? Infinity : cost, isTimeUp);
      if (found) incumbent.offer(found.uses);
    }
  };
  roundsOf(FIRST_ROUNDS);
  if (isOver()) return incumbent;
  const relaxation = problem.widths.length <= MAX_LP_WIDTHS ? relax(incumbent, isTimeUp) : undefined;
  if (relaxation) dive(relaxation, incumbent, 0, random, isOver);
  const mixes = new MixSearch(incumbent, relaxation, values, random, isOver);
  let isShort = false;
  for (let turn = 0; !isOver(); turn++) {
    if (relaxation && turn > 0) {
      dive(relaxation, incumbent, 0.4, random, isOver);
      values.startFrom(relaxation.worths());
    }
    roundsOf(FIRST_ROUNDS);
    incumbent.raiseBound(0);
    const effort = Math.min(turn, 12);
    if (incumbent.best.missing === 0) mixes.turn(effort);
    else if (!isShort) isShort = tryAllBoards(incumbent, effort, isTimeUp);
    else if (turn > TURNS_WHEN_SHORT) break;
  }
  return incumbent;
}

/** Tries to place everything on all the boards there are. @returns true when that is impossible */
function tryAllBoards(incumbent: Incumbent, effort: number, isTimeUp: TimeIsUp): boolean {
  const { problem } = incumbent;
  const boards = limitsOf(problem);
  const room = problem.slots.reduce((sum, { boundRoom, kind }) => sum + boundRoom * boards[kind]!, 0);
  const needed = problem.widths.reduce((sum, width, i) => sum + width * problem.demands[i]!, 0);
  if (room < needed) return true;
  const answer = fillMix(problem, { boards, cost: 0, spare: room - needed }, 500 * 4 ** effort, isTimeUp);
  if (typeof answer !== 'string') incumbent.offer(answer.found);
  return answer === 'impossible';
}

/** The relaxation worked out as far as the time allows; its bounds go to the incumbent. */
function relax(incumbent: Incumbent, isTimeUp: TimeIsUp): PatternLp {
  const relaxation = new PatternLp(incumbent.problem, mostBoards(incumbent));
  for (const { pattern } of incumbent.best.uses) relaxation.add(pattern);
  relaxation.generate(Int32Array.from(incumbent.problem.demands), isTimeUp, (bound) => {
    incumbent.raiseBound(bound);
    return incumbent.isProved;
  });
  return relaxation;
}

function mostBoards({ problem, best }: Incumbent): Int32Array {
  return Int32Array.from(problem.kinds, ({ cost, limit }) =>
    best.missing > 0 || cost === 0 ? limit : Math.min(limit, Math.floor(best.cost / cost)),
  );
}
