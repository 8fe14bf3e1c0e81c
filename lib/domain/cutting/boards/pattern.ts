import type { PackingProblem } from './packing-problem';

/** One way to fill a slot: how many of each width. */
export interface Pattern {
  slot: number;
  counts: Int32Array;
}

export interface PatternUse {
  pattern: Pattern;
  times: number;
}

/** A plan as the search sees it. */
export interface Packing {
  uses: PatternUse[];
  /** In cost units. */
  cost: number;
  /** How many boards of each kind. */
  boards: Int32Array;
  /** Pieces that found no place. */
  missing: number;
}

export function patternKey({ slot, counts }: Pattern): string {
  return `${slot}:${counts.join()}`;
}

export function widthOf(problem: PackingProblem, counts: Int32Array): number {
  let sum = 0;
  for (let i = 0; i < counts.length; i++) sum += counts[i]! * problem.widths[i]!;
  return sum;
}

/** How often a pattern can be used until one of its widths is no longer wanted that often. */
export function timesWithin(counts: Int32Array, left: Int32Array): number {
  let times = Infinity;
  for (let i = 0; i < counts.length; i++)
    if (counts[i]! > 0) times = Math.min(times, Math.floor(left[i]! / counts[i]!));
  return times === Infinity ? 0 : times;
}

export function takeFrom(left: Int32Array, counts: Int32Array, times: number): void {
  for (let i = 0; i < counts.length; i++) left[i]! -= times * counts[i]!;
}

/** Boards of each kind that hold the patterns: as many as its fullest slot needs. */
export function boardsUsed(problem: PackingProblem, uses: readonly PatternUse[]): Int32Array {
  const perSlot = new Int32Array(problem.slots.length);
  for (const { pattern, times } of uses) perSlot[pattern.slot]! += times;
  return Int32Array.from(problem.kinds, ({ slots }) => slots.reduce((most, slot) => Math.max(most, perSlot[slot]!), 0));
}

/** Adds up what a list of uses costs and leaves out; pieces beyond the demand are taken away first. */
export function packingOf(problem: PackingProblem, uses: readonly PatternUse[]): Packing {
  const left = Int32Array.from(problem.demands);
  const kept: PatternUse[] = [];
  for (const { pattern, times } of uses) {
    const whole = Math.min(times, timesWithin(pattern.counts, left));
    if (whole > 0) kept.push({ pattern, times: whole });
    takeFrom(left, pattern.counts, whole);
    for (let extra = whole; extra < times; extra++) {
      const counts = pattern.counts.map((count, i) => Math.min(count, left[i]!));
      if (!counts.some((count) => count > 0)) break;
      takeFrom(left, counts, 1);
      kept.push({ pattern: { slot: pattern.slot, counts }, times: 1 });
    }
  }
  const boards = boardsUsed(problem, kept);
  const cost = problem.kinds.reduce((sum, kind, k) => sum + kind.cost * boards[k]!, 0);
  return { uses: kept, cost, boards, missing: left.reduce((sum, count) => sum + count, 0) };
}

/** Fewer pieces without a place come first, then less cost. */
export function isCheaper(a: Packing, b: Packing): boolean {
  return a.missing !== b.missing ? a.missing < b.missing : a.cost < b.cost;
}
