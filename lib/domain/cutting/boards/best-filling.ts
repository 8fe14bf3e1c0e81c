/** Table cells of one dynamic programme at most; past it fillings are found by a bounded search. */
const MAX_CELLS = 24_000_000;
/** Up to so many the table is quicker than any search. */
const QUICK_CELLS = 1_500_000;
/** Nodes of one bounded search at most. */
const MAX_NODES = 10_000;
/** Widths on one board at most in a bounded search, so that it never runs out of stack. */
const MAX_DEPTH = 500;

/** How a room is best filled for given worths. */
export interface Filling {
  counts: Int32Array;
  value: number;
  /** No filling is worth more; equal to `value` when the search was complete. */
  atMost: number;
}

/**
 * Best fillings for one set of worths and limits, for any room up to the one they were made for. Where a table would be
 * slow, a filling worth more than `enough` is taken without looking for the best.
 */
export type BestFilling = (room: number, enough?: number) => Filling;

/**
 * The bounded knapsack: at most `limits[i]` pieces of width i, each worth `worths[i]`.
 *
 * One dynamic programme over room answers every room at once; limits are split into powers of two. Where the table
 * would be large a depth-first search by worth per width comes first, whose `atMost` stays valid when it is cut short. Sums of worths are exact when the caller rounds worths to a common power of two.
 */
export class FillingTable {
  private readonly best: Float64Array;
  private took = new Uint8Array(0);

  constructor(
    private readonly widths: readonly number[],
    private readonly maxRoom: number,
  ) {
    this.best = new Float64Array(maxRoom <= MAX_CELLS ? maxRoom + 1 : 0);
  }

  /** The answer is valid until the next call. */
  fill(worths: ArrayLike<number>, limits: ArrayLike<number>): BestFilling {
    const rows = this.splitLimits(worths, limits);
    const cells = rows.length * (this.maxRoom + 1);
    if (this.best.length > 0 && cells <= QUICK_CELLS) return this.tabulate(rows, worths);
    const order = this.byWorthPerWidth(worths, limits);
    const fits = this.best.length > 0 && cells <= MAX_CELLS;
    let table: BestFilling | undefined;
    return (room, enough = Infinity) => {
      const searched = this.search(room, worths, limits, order);
      if (!fits || searched.value === searched.atMost || searched.value > enough) return searched;
      table ??= this.tabulate(rows, worths);
      return table(room);
    };
  }

  private splitLimits(worths: ArrayLike<number>, limits: ArrayLike<number>): { i: number; times: number }[] {
    const rows: { i: number; times: number }[] = [];
    for (let i = 0; i < this.widths.length; i++) {
      if (!(worths[i]! > 0)) continue;
      let left = Math.min(limits[i]!, Math.floor(this.maxRoom / this.widths[i]!));
      for (let times = 1; left > 0; times *= 2) {
        rows.push({ i, times: Math.min(times, left) });
        left -= times;
      }
    }
    return rows;
  }

  private tabulate(rows: { i: number; times: number }[], worths: ArrayLike<number>): BestFilling {
    const { best, widths, maxRoom } = this;
    const stride = maxRoom + 1;
    if (this.took.length < rows.length * stride) this.took = new Uint8Array(rows.length * stride);
    const took = this.took;
    took.fill(0, 0, rows.length * stride);
    best.fill(0);
    rows.forEach(({ i, times }, row) => {
      const width = widths[i]! * times;
      const worth = worths[i]! * times;
      const base = row * stride;
      for (let room = maxRoom; room >= width; room--) {
        const value = best[room - width]! + worth;
        if (value > best[room]!) {
          best[room] = value;
          took[base + room] = 1;
        }
      }
    });
    return (room) => {
      const counts = new Int32Array(widths.length);
      let left = room;
      for (let row = rows.length - 1; row >= 0; row--) {
        if (took[row * stride + left] !== 1) continue;
        const { i, times } = rows[row]!;
        counts[i]! += times;
        left -= widths[i]! * times;
      }
      return { counts, value: best[room]!, atMost: best[room]! };
    };
  }

  private byWorthPerWidth(worths: ArrayLike<number>, limits: ArrayLike<number>): number[] {
    return Array.from(this.widths.keys())
      .filter((i) => worths[i]! > 0 && limits[i]! > 0)
      .sort((a, b) => worths[b]! / this.widths[b]! - worths[a]! / this.widths[a]! || a - b);
  }

  private search(room: number, worths: ArrayLike<number>, limits: ArrayLike<number>, order: number[]): Filling {
    const { widths } = this;
    const counts = new Int32Array(widths.length);
    let best = new Int32Array(widths.length);
    let bestValue = 0;
    let nodes = 0;
    let given = 0;
    const shortest = new Float64Array(order.length + 1).fill(Infinity);
    for (let at = order.length - 1; at >= 0; at--) shortest[at] = Math.min(shortest[at + 1]!, widths[order[at]!]!);
    const visit = (from: number, left: number, value: number, depth: number): void => {
      if (value > bestValue) {
        bestValue = value;
        best = counts.slice();
      }
      for (let at = from; at < order.length && left >= shortest[at]!; at++) {
        const i = order[at]!;
        const width = widths[i]!;
        if (width > left) continue;
        const bound = value + (worths[i]! * left) / width;
        if (bound <= bestValue) return;
        if (++nodes > MAX_NODES || depth > MAX_DEPTH) {
          given = Math.max(given, bound);
          return;
        }
        for (let count = Math.min(limits[i]!, Math.floor(left / width)); count > 0; count--) {
          counts[i] = count;
          visit(at + 1, left - count * width, value + count * worths[i]!, depth + 1);
        }
        counts[i] = 0;
      }
    };
    visit(0, room, 0, 0);
    return { counts: best, value: bestValue, atMost: Math.max(bestValue, given) };
  }
}
