import { FillingTable } from './best-filling';
import type { BoardKind, PackingProblem } from './packing-problem';
import { limitsOf } from './quick-packing';
import { packingOf, takeFrom, timesWithin, widthOf, type Packing, type Pattern, type PatternUse } from './pattern';
import type { TimeIsUp } from '../run-control';

/** What a board that costs nothing counts for where its share is passed on to widths. */
const FREE = 1e-3;

interface FilledBoard {
  kind: number;
  patterns: Pattern[];
  counts: Int32Array;
}

/**
 * Sequential value correction (Belov and Scheithauer 2007): board after board gets the filling that is worth most, then
 * the worth of the widths in it moves towards what they really cost there, so that widths that fit badly come earlier
 * in the next round. One table answers every kind of board at once.
 */
export class SequentialValues {
  private readonly values: Float64Array;
  private readonly table: FillingTable;

  constructor(
    private readonly problem: PackingProblem,
    private readonly random: () => number,
  ) {
    const largest = problem.slots.reduce((most, { room }) => Math.max(most, room), 0);
    this.table = new FillingTable(problem.widths, largest);
    this.values = Float64Array.from(problem.widths, (width) => this.startValue(width));
  }

  /** Starts from given worths, such as duals, where they are above zero. */
  startFrom(worths: ArrayLike<number>): void {
    this.problem.widths.forEach((width, i) => {
      this.values[i] = worths[i]! > 0 ? worths[i]! : this.startValue(width) * 0.9;
    });
  }

  /**
   * One plan from at most the given number of boards of each kind.
   *
   * @returns undefined when it was given up: it cost more than `ceiling`, or the time was up
   */
  round(ceiling: number, isTimeUp: TimeIsUp, boards = limitsOf(this.problem)): Packing | undefined {
    const { problem } = this;
    const left = Int32Array.from(problem.demands);
    const limits = boards.slice();
    const uses: PatternUse[] = [];
    let cost = 0;
    while (left.some((count) => count > 0)) {
      if (isTimeUp()) return undefined;
      const board = this.bestBoard(left, limits);
      if (!board) break;
      let times = Math.min(limits[board.kind]!, timesWithin(board.counts, left));
      if (times > 1) times = Math.max(1, Math.floor(times * (0.5 + this.random() * 0.5)));
      limits[board.kind]! -= times;
      takeFrom(left, board.counts, times);
      cost += times * problem.kinds[board.kind]!.cost;
      for (const pattern of board.patterns) uses.push({ pattern, times });
      this.correct(board, times);
      if (cost > ceiling) return undefined;
    }
    return packingOf(problem, uses);
  }

  private startValue(width: number): number {
    const { kinds } = this.problem;
    const perWidth = kinds.map(({ cost, slots }) => Math.max(cost, FREE) / roomOf(this.problem, slots));
    return perWidth.reduce((a, b) => Math.min(a, b), Infinity) * this.stressed(width);
  }

  private bestBoard(left: Int32Array, limits: Int32Array): FilledBoard | undefined {
    const { kinds, slots, widths } = this.problem;
    const fill = this.table.fill(this.values, left);
    let best: FilledBoard | undefined;
    let bestScore = 0;
    const offer = (kind: number, patterns: Pattern[], counts: Int32Array, value: number) => {
      const score = this.score(value, kinds[kind]!);
      if (score <= bestScore) return;
      bestScore = score;
      best = { kind, patterns, counts };
    };
    kinds.forEach((kind, k) => {
      if (limits[k]! === 0 || kind.slots.length > 1) return;
      const slot = kind.slots[0]!;
      const { counts, value } = fill(slots[slot]!.room, 0);
      offer(k, [{ slot, counts }], counts, value);
    });
    kinds.forEach((kind, k) => {
      if (limits[k]! === 0 || kind.slots.length === 1) return;
      const rest = left.slice();
      const all = new Int32Array(widths.length);
      let sum = 0;
      const patterns = kind.slots.map((slot) => {
        const { counts, value } = this.table.fill(this.values, rest)(slots[slot]!.room, 0);
        takeFrom(rest, counts, 1);
        takeFrom(all, counts, -1);
        sum += value;
        return { slot, counts };
      });
      offer(k, patterns, all, sum);
    });
    return best;
  }

  /** Worth had for the cost; boards that cost nothing come first, those well filled before others. */
  private score(value: number, { cost, slots }: BoardKind): number {
    if (value <= 0) return 0;
    if (cost === 0) return (1e9 * value) / roomOf(this.problem, slots);
    return (value / cost) * (this.problem.kinds.length > 1 ? 1 + 0.01 * this.random() : 1);
  }

  private correct({ kind, counts }: FilledBoard, times: number): void {
    const { widths, demands, kinds } = this.problem;
    const perWidth = Math.max(kinds[kind]!.cost, FREE) / widthOf(this.problem, counts);
    const strength = 1 + this.random() * 3;
    counts.forEach((count, i) => {
      if (count === 0) return;
      const kept = strength * demands[i]!;
      const cut = count * times;
      this.values[i] = (kept * this.values[i]! + cut * perWidth * this.stressed(widths[i]!)) / (kept + cut);
    });
  }

  /** Long parts are worth a little more than their length, since little else fits beside them. */
  private stressed(width: number): number {
    return width * (width / this.problem.widths[0]!) ** 0.02;
  }
}

function roomOf(problem: PackingProblem, slots: number[]): number {
  return slots.reduce((sum, slot) => sum + problem.slots[slot]!.room, 0);
}
