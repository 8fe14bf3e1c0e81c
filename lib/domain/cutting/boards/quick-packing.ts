import type { PackingProblem } from './packing-problem';
import { isCheaper, packingOf, takeFrom, timesWithin, type Packing, type Pattern, type PatternUse } from './pattern';
import type { TimeIsUp } from '../run-control';

/**
 * A plan at once: board after board, longest parts first, each time on the kind that costs least for the wood it uses.
 * Tried once over all kinds and once with each kind preferred; the cheapest is kept. Near linear in pieces.
 */
export function quickPacking(problem: PackingProblem, isTimeUp: TimeIsUp): Packing {
  let best = packingOf(problem, fillQuickly(problem, Int32Array.from(problem.demands), limitsOf(problem)));
  if (problem.kinds.length === 1) return best;
  for (let preferred = 0; preferred < Math.min(problem.kinds.length, 12) && !isTimeUp(); preferred++) {
    const uses = fillQuickly(problem, Int32Array.from(problem.demands), limitsOf(problem), preferred);
    const packing = packingOf(problem, uses);
    if (isCheaper(packing, best)) best = packing;
  }
  return best;
}

export function limitsOf(problem: PackingProblem): Int32Array {
  return Int32Array.from(problem.kinds, ({ limit }) => limit);
}

/** Fills boards with what is left, longest first. Both arrays are used up. */
export function fillQuickly(
  problem: PackingProblem,
  left: Int32Array,
  limits: Int32Array,
  preferred?: number,
): PatternUse[] {
  const uses: PatternUse[] = [];
  const present = new PresentWidths(problem.widths, left);
  for (;;) {
    let best: { kind: number; filled: Filled; score: number } | undefined;
    problem.kinds.forEach(({ cost, slots }, kind) => {
      if (limits[kind]! === 0) return;
      const filled = fillBoard(problem, slots, left, present);
      if (filled.width === 0) return;
      const room = slots.reduce((sum, slot) => sum + problem.slots[slot]!.room, 0);
      const score = (kind === preferred ? 0.5 : 1) * (cost / filled.width) + (room / filled.width) * 1e-9;
      if (!best || score < best.score) best = { kind, filled, score };
    });
    if (!best) return uses;
    const { kind, filled } = best;
    const times = Math.min(limits[kind]!, timesWithin(filled.counts, left));
    limits[kind]! -= times;
    takeFrom(left, filled.counts, times);
    filled.counts.forEach((count, i) => {
      if (count > 0 && left[i] === 0) present.remove(i);
    });
    for (const pattern of filled.patterns) uses.push({ pattern, times });
  }
}

interface Filled {
  patterns: Pattern[];
  /** Over all slots of the board. */
  counts: Int32Array;
  width: number;
}

function fillBoard(problem: PackingProblem, slots: number[], left: Int32Array, present: PresentWidths): Filled {
  const { widths } = problem;
  const counts = new Int32Array(widths.length);
  const patterns: Pattern[] = [];
  let width = 0;
  for (const slot of slots) {
    let room = problem.slots[slot]!.room;
    const own = slots.length === 1 ? counts : new Int32Array(widths.length);
    const before = width;
    for (let i = present.firstWithin(room, 0); i < widths.length; i = present.firstWithin(room, i + 1)) {
      const count = Math.min(left[i]! - counts[i]!, Math.floor(room / widths[i]!));
      if (count === 0) continue;
      own[i] = count;
      if (own !== counts) counts[i]! += count;
      room -= count * widths[i]!;
      width += count * widths[i]!;
    }
    if (width > before) patterns.push({ slot, counts: own });
  }
  return { patterns, counts, width };
}

/** Which widths are still wanted, so that ten thousand of them are not walked through for each board. */
class PresentWidths {
  private readonly next: Int32Array;

  constructor(
    private readonly widths: readonly number[],
    left: Int32Array,
  ) {
    this.next = Int32Array.from({ length: widths.length + 1 }, (_, i) => i);
    for (let i = 0; i < widths.length; i++) if (left[i] === 0) this.remove(i);
  }

  remove(i: number): void {
    this.next[i] = i + 1;
  }

  /** The first wanted width at or after `from` that is at most `room`; the number of widths when there is none. */
  firstWithin(room: number, from: number): number {
    let low = from;
    let high = this.widths.length;
    while (low < high) {
      const middle = (low + high) >> 1;
      if (this.widths[middle]! <= room) high = middle;
      else low = middle + 1;
    }
    return this.find(low);
  }

  private find(i: number): number {
    let root = i;
    while (this.next[root] !== root) root = this.next[root]!;
    while (this.next[i] !== root && i !== root) {
      const following = this.next[i]!;
      this.next[i] = root;
      i = following;
    }
    return root;
  }
}
