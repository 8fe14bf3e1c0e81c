import { boardMixes, isWithin, type BoardMix } from './board-mixes';
import { fillMix } from './fill-mix';
import type { Incumbent } from './incumbent';
import { ROUNDING_MARGIN, type PatternLp } from './pattern-lp';
import { dive } from './pattern-search';
import type { SequentialValues } from './sequential-values';
import type { TimeIsUp } from '../run-control';

const MAX_MIXES = 4_000;
const FIRST_ROUNDS = 8;
const FIRST_NODES = 500;

/**
 * Settles the mixes of boards between the bound and the best cost one after the other, cheapest first, with twice the
 * effort each time round: the relaxation with the mix fixed may refute it; corrected rounds, a dive and bin completion
 * may fill it; bin completion may refute it. The bound rises to the cheapest mix not refuted.
 */
export class MixSearch {
  private mixes: BoardMix[] | undefined;
  private readonly impossible: BoardMix[] = [];
  private readonly relaxed = new Set<BoardMix>();

  constructor(
    private readonly incumbent: Incumbent,
    private readonly relaxation: PatternLp | undefined,
    private readonly values: SequentialValues,
    private readonly random: () => number,
    private readonly isOver: TimeIsUp,
  ) {}

  /** @returns false when there are too many mixes to go through */
  turn(effort: number): boolean {
    const { incumbent } = this;
    this.mixes ??= boardMixes(incumbent.problem, incumbent.lowerBound, incumbent.best.cost, MAX_MIXES);
    if (!this.mixes) return false;
    for (const mix of this.mixes) {
      if (this.isOver()) return true;
      if (mix.cost >= incumbent.best.cost) break;
      if (this.isRefuted(mix, effort)) this.impossible.push(mix);
    }
    this.mixes = this.mixes.filter((mix) => mix.cost < incumbent.best.cost && !this.isKnownImpossible(mix));
    incumbent.raiseBound(this.mixes[0]?.cost ?? incumbent.best.cost);
    return true;
  }

  private isRefuted(mix: BoardMix, effort: number): boolean {
    const { incumbent, values } = this;
    if (this.isKnownImpossible(mix)) return true;
    if (this.isBeyondRelaxation(mix, effort)) return true;
    if (incumbent.best.cost <= mix.cost) return false;
    for (let n = 0; n < FIRST_ROUNDS * 2 ** effort && !this.isOver(); n++) {
      const found = values.round(mix.cost, this.isOver, mix.boards);
      if (found && incumbent.offer(found.uses)) return false;
    }
    const answer = fillMix(incumbent.problem, mix, FIRST_NODES * 4 ** effort, this.isOver);
    if (answer === 'impossible') return true;
    if (answer !== 'unknown') incumbent.offer(answer.found);
    return false;
  }

  /** Solves the relaxation on this mix, and from the second time on dives from it. */
  private isBeyondRelaxation(mix: BoardMix, effort: number): boolean {
    const { incumbent, relaxation } = this;
    if (!relaxation) return false;
    const { lp, problem } = relaxation;
    const before = problem.kinds.map((_, kind) => lp.upperOf(relaxation.kindColumn(kind)));
    mix.boards.forEach((boards, kind) => lp.setBounds(relaxation.kindColumn(kind), boards, boards));
    let isBeyond = false;
    if (!this.relaxed.has(mix)) {
      const isDone =
        lp.solve(this.isOver) &&
        relaxation.generate(Int32Array.from(problem.demands), this.isOver, (bound) => {
          isBeyond ||= bound > mix.cost + ROUNDING_MARGIN;
          return isBeyond;
        });
      if (isDone) this.relaxed.add(mix);
    }
    if (!isBeyond) dive(relaxation, incumbent, effort === 0 ? 0 : 0.4, this.random, this.isOver);
    before.forEach((upper, kind) => lp.setBounds(relaxation.kindColumn(kind), 0, upper));
    return isBeyond;
  }

  private isKnownImpossible(mix: BoardMix): boolean {
    return this.impossible.some((other) => isWithin(mix, other));
  }
}
