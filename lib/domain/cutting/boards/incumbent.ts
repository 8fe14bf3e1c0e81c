import { isCheaper, packingOf, type Packing, type PatternUse } from './pattern';
import type { PackingProblem } from './packing-problem';
import type { RoundUp } from './possible-costs';

/** The best plan so far and the best bound, in cost units. */
export class Incumbent {
  /** No plan costs less; a cost that a plan can have. */
  lowerBound = 0;
  roundUp: RoundUp = Math.ceil;

  constructor(
    readonly problem: PackingProblem,
    public best: Packing,
    private readonly onBetter: (best: Packing) => void,
  ) {}

  /** Keeps the plan if it is cheaper. */
  offer(uses: readonly PatternUse[]): boolean {
    const packing = packingOf(this.problem, uses);
    if (!this.isAllowed(packing) || !isCheaper(packing, this.best)) return false;
    this.best = packing;
    this.onBetter(packing);
    return true;
  }

  raiseBound(bound: number): void {
    this.lowerBound = Math.max(this.lowerBound, Math.min(this.best.cost, this.roundUp(bound)));
  }

  get isProved(): boolean {
    return this.best.missing === 0 && this.lowerBound >= this.best.cost;
  }

  /** True when no plan above this bound can be cheaper than the best. */
  isBeaten(bound: number): boolean {
    return this.best.missing === 0 && this.roundUp(bound) >= this.best.cost;
  }

  private isAllowed({ boards }: Packing): boolean {
    return boards.every((count, kind) => count <= this.problem.kinds[kind]!.limit);
  }
}
