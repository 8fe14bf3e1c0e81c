import { FillingTable, type Filling } from './best-filling';
import { LinearProgram } from './linear-program';
import type { PackingProblem } from './packing-problem';
import { patternKey, takeFrom, timesWithin, type Pattern } from './pattern';
import type { TimeIsUp } from '../run-control';

/** Share of one cost unit by which a bound must pass a multiple before it is rounded up to the next one. */
export const ROUNDING_MARGIN = 1e-6;
const COMPLEMENTS = 4;

/**
 * The pattern relaxation (Gilmore and Gomory 1961) with one column for the number of boards of each kind: patterns cost
 * nothing themselves but may not outnumber the boards of their kind. Only patterns that no demand exceeds are made,
 * which bounds short lists better than the plain relaxation.
 *
 * Rows: every width, then every slot: a kind with defects gives each of its boards one of each of its slots.
 */
export class PatternLp {
  readonly lp: LinearProgram;
  readonly patterns: Pattern[] = [];
  private readonly known = new Set<string>();
  private readonly firstKind: number;
  private readonly firstPattern: number;
  private readonly table: FillingTable;
  private readonly quantum: number;
  private readonly widthCount: number;

  /**
   * @param most  the number of boards of each kind that a plan worth finding has at most
   */
  constructor(
    readonly problem: PackingProblem,
    readonly most: Int32Array,
  ) {
    const { widths, demands, kinds, slots } = problem;
    const dearest = kinds.reduce((cost, kind) => Math.max(cost, kind.cost), 1);
    const penalties = widths.map((width) => missingPenalty(problem, width, dearest));
    const perBoard = penalties.reduce((a, b) => Math.max(a, b), 0) * 4;
    this.widthCount = widths.length;
    this.lp = new LinearProgram(
      [...demands, ...slots.map(() => 0)],
      [...penalties, ...slots.map(() => perBoard)],
      dearest,
    );
    this.firstKind = this.lp.columns;
    kinds.forEach((kind, k) => {
      const rows = kind.slots.map((slot) => widths.length + slot);
      this.lp.addColumn(
        kind.cost,
        rows,
        rows.map(() => 1),
        0,
        most[k]!,
      );
    });
    this.firstPattern = this.lp.columns;
    const largest = slots.reduce((room, { boundRoom }) => Math.max(room, boundRoom), 0);
    this.table = new FillingTable(widths, largest);
    const total = kinds.reduce((sum, { cost }, kind) => sum + cost * most[kind]!, dearest * 16);
    this.quantum = 2 ** (Math.ceil(Math.log2(total)) - 50);
  }

  kindColumn(kind: number): number {
    return this.firstKind + kind;
  }

  patternColumn(pattern: number): number {
    return this.firstPattern + pattern;
  }

  /** @returns false when the pattern was known before or holds nothing */
  add(pattern: Pattern): boolean {
    const key = patternKey(pattern);
    if (this.known.has(key)) return false;
    this.known.add(key);
    const rows: number[] = [];
    const entries: number[] = [];
    let useful = 0;
    pattern.counts.forEach((count, i) => {
      if (count === 0) return;
      rows.push(i);
      entries.push(count);
      useful = Math.max(useful, Math.ceil(this.problem.demands[i]! / count));
    });
    if (rows.length === 0) return false;
    rows.push(this.widthCount + pattern.slot);
    entries.push(-1);
    this.patterns.push(pattern);
    // One more than can be of use: at a bound that holds, the duals would leave out what the bound is worth.
    this.lp.addColumn(0, rows, entries, 0, useful + 1);
    return true;
  }

  /**
   * Adds patterns until none would lower the relaxation.
   *
   * @param left     how many of each width patterns may still hold; the whole demand at the root
   * @param onBound  told of each bound on plans within the present bounds of the kinds, which holds when `left` is the
   *   whole demand; true ends the work
   * @returns false when the time was up or the solver gave up
   */
  generate(left: Int32Array, isTimeUp: TimeIsUp, onBound?: (bound: number) => boolean): boolean {
    for (;;) {
      if (!this.lp.improve(isTimeUp)) return false;
      const found = this.price(left);
      if (onBound?.(found.bound)) return true;
      let added = false;
      for (const pattern of found.patterns) added = this.add(pattern) || added;
      if (!added) return true;
      if (isTimeUp()) return false;
    }
  }

  /**
   * Best pattern of each kind for the present duals, and the bound they prove: by weak duality any duals of zero or more
   * bound every plan from below once each kind's dearest pattern is known. Duals are rounded to a power of two so that
   * all sums are exact.
   */
  private price(left: Int32Array): { patterns: Pattern[]; bound: number } {
    const { kinds, demands, slots } = this.problem;
    const worths = this.worths();
    const fill = this.table.fill(worths, left);
    const known = new Map<number, Filling>();
    const fillOnce = (room: number, enough?: number) => {
      const filling = known.get(room) ?? fill(room, enough);
      known.set(room, filling);
      return filling;
    };
    // A filling worth more than its slot is a pattern to add; only once there is none must the best be known.
    const enough = (slot: number) => Math.max(0, this.lp.duals[this.widthCount + slot]!) * 1.0001;
    const slotWorths = Float64Array.from(slots, ({ boundRoom }, slot) => fillOnce(boundRoom, enough(slot)).atMost);
    let bound = 0;
    for (let i = 0; i < worths.length; i++) bound += worths[i]! * demands[i]!;
    kinds.forEach(({ cost, slots: own }, k) => {
      const spare = cost - own.reduce((sum, slot) => sum + slotWorths[slot]!, 0);
      bound += Math.min(spare * this.lp.lowerOf(this.kindColumn(k)), spare * this.lp.upperOf(this.kindColumn(k)));
    });
    const candidates: { pattern: Pattern; gain: number }[] = [];
    slots.forEach(({ room, kind }, slot) => {
      const { counts, value } = fillOnce(room);
      const gain = value - Math.max(0, this.lp.duals[this.widthCount + slot]!);
      if (gain > 1e-8 * Math.max(1, kinds[kind]!.cost)) candidates.push({ pattern: { slot, counts }, gain });
    });
    if (slots.length === 1 && candidates.length > 0) this.addComplements(candidates, left, worths);
    candidates.sort((a, b) => b.gain - a.gain || a.pattern.slot - b.pattern.slot);
    return { patterns: candidates.map(({ pattern }) => pattern), bound };
  }

  /** With one slot, also the best patterns of what the patterns so far leave over: they go together in a plan. */
  private addComplements(
    candidates: { pattern: Pattern; gain: number }[],
    left: Int32Array,
    worths: Float64Array,
  ): void {
    const [slot] = this.problem.slots;
    const least = Math.max(0, this.lp.duals[this.widthCount]!);
    const rest = left.slice();
    for (let n = 0; n < COMPLEMENTS; n++) {
      const { counts } = candidates.at(-1)!.pattern;
      takeFrom(rest, counts, Math.max(1, timesWithin(counts, rest)));
      const { counts: next, value } = this.table.fill(worths, rest)(slot!.room, 0);
      if (value - least <= 1e-8) return;
      candidates.push({ pattern: { slot: 0, counts: next }, gain: value - least });
    }
  }

  /** Duals of the widths as exact sums need them. */
  worths(): Float64Array {
    const worths = new Float64Array(this.widthCount);
    for (let i = 0; i < worths.length; i++)
      worths[i] = Math.max(0, Math.floor(this.lp.duals[i]! / this.quantum) * this.quantum);
    return worths;
  }
}

/** More than any plan could pay for one piece, so that leaving one out is never the cheaper way. */
function missingPenalty(problem: PackingProblem, width: number, dearest: number): number {
  const isAlwaysHad = problem.slots.some(({ kind, room }) => !problem.kinds[kind]!.limited && room >= width);
  if (isAlwaysHad) return 2 * dearest + 1;
  return problem.kinds.reduce((sum, { cost, limit }) => sum + cost * limit, 2 * dearest + 1);
}
