import { isCheaper, packingOf, type Packing, type PatternUse } from './pattern';
import type { PackingProblem } from './packing-problem';
import { possibleCosts, type RoundUp } from './possible-costs';

const MOST_TIES = 24;

/** The best plan so far and the best bound, in cost units. */
export class Incumbent {
  /** No plan costs less; a cost that a plan can have. 0 until everything has a place. */
  lowerBound = 0;
  /** Other plans of the same cost, to choose between by what they leave over. */
  ties: Packing[] = [];
  private highest = 0;
  private roundUp: RoundUp | undefined;

  constructor(
    readonly problem: PackingProblem,
    public best: Packing,
    private readonly onBetter: (best: Packing) => void,
  ) {}

  /** Keeps the plan if it is cheaper. */
  offer(uses: readonly PatternUse[]): boolean {
    const packing = packingOf(this.problem, uses);
    if (!this.isAllowed(packing)) return false;
    if (!isCheaper(packing, this.best)) {
      if (!isCheaper(this.best, packing) && this.ties.length < MOST_TIES) this.ties.push(packing);
      return false;
    }
    this.best = packing;
    this.ties = [];
    this.onBetter(packing);
    return true;
  }

  /** Takes note of a bound on every plan; it counts once there is a plan that places everything. */
  raiseBound(bound: number): void {
    this.highest = Math.max(this.highest, bound);
    if (this.best.missing > 0) return;
    this.roundUp ??= possibleCosts(this.problem, this.best.cost);
    this.lowerBound = Math.max(this.lowerBound, Math.min(this.best.cost, this.roundUp(this.highest)));
  }

  get isProved(): boolean {
    return this.best.missing === 0 && this.lowerBound >= this.best.cost;
  }

  /** True when no plan above this bound can be cheaper than the best. */
  isBeaten(bound: number): boolean {
    if (this.best.missing > 0) return false;
    this.roundUp ??= possibleCosts(this.problem, this.best.cost);
    return this.roundUp(bound) >= this.best.cost;
  }

  private isAllowed({ boards }: Packing): boolean {
    return boards.every((count, kind) => count <= this.problem.kinds[kind]!.limit);
  }
}
