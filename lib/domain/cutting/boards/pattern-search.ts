import type { Incumbent } from './incumbent';
import type { PatternLp } from './pattern-lp';
import { fillQuickly, limitsOf } from './quick-packing';
import { boardsUsed, takeFrom, timesWithin, type PatternUse } from './pattern';
import type { TimeIsUp } from '../run-control';

const WHOLE = 1e-5;

/**
 * One dive: patterns that the relaxation uses whole are fixed, then the one it uses most of; the rest is priced again
 * with what is still wanted, down to a plan. Before each step the rest is also filled quickly, so that a dive that is cut
 * short still offers plans.
 *
 * @param restlessness 0 always takes the largest share; above 0 mixes that much chance into the choice
 */
export function dive(
  relaxation: PatternLp,
  incumbent: Incumbent,
  restlessness: number,
  random: () => number,
  isTimeUp: TimeIsUp,
): void {
  const { lp, problem } = relaxation;
  const left = Int32Array.from(problem.demands);
  const fixed = new Map<number, number>();
  const before: { column: number; lower: number; upper: number }[] = [];
  const bind = (column: number, lower: number, upper: number) => {
    before.push({ column, lower: lp.lowerOf(column), upper: lp.upperOf(column) });
    lp.setBounds(column, lower, upper);
  };
  while (!isTimeUp() && !incumbent.isProved) {
    if (!lp.solve(isTimeUp) || !relaxation.generate(left, isTimeUp)) break;
    if (incumbent.isBeaten(lp.value - WHOLE)) break;
    const chosen = choose(relaxation, left, fixed, restlessness, random);
    if (chosen.length === 0) break;
    for (const { pattern, times } of chosen) {
      fixed.set(pattern, (fixed.get(pattern) ?? 0) + times);
      takeFrom(left, relaxation.patterns[pattern]!.counts, times);
    }
    offerWithQuickRest(relaxation, incumbent, fixed, left);
    if (left.every((count) => count === 0)) break;
    relaxation.patterns.forEach(({ counts }, pattern) => {
      const column = relaxation.patternColumn(pattern);
      const lower = fixed.get(pattern) ?? 0;
      const upper = Math.min(lp.upperOf(column), lower + timesWithin(counts, left));
      if (upper < lp.upperOf(column) || lower > lp.lowerOf(column)) bind(column, lower, Math.max(lower, upper));
    });
  }
  for (const { column, lower, upper } of before.reverse()) lp.setBounds(column, lower, upper);
}

/** All that the relaxation uses whole and is not fixed yet; otherwise one copy of the pattern it uses most of. */
function choose(
  relaxation: PatternLp,
  left: Int32Array,
  fixed: Map<number, number>,
  restlessness: number,
  random: () => number,
): { pattern: number; times: number }[] {
  const rest = left.slice();
  const whole: { pattern: number; times: number }[] = [];
  let best = -1;
  let most = 0;
  relaxation.patterns.forEach(({ counts }, pattern) => {
    const share = relaxation.lp.valueOf(relaxation.patternColumn(pattern)) - (fixed.get(pattern) ?? 0);
    if (share < WHOLE) return;
    const times = Math.min(Math.floor(share + WHOLE), timesWithin(counts, rest));
    if (times > 0) {
      whole.push({ pattern, times });
      takeFrom(rest, counts, times);
    }
    if (timesWithin(counts, left) === 0) return;
    const weight = share - Math.floor(share + WHOLE) + restlessness * random();
    if (weight <= most) return;
    most = weight;
    best = pattern;
  });
  if (whole.length > 0) return whole;
  return best < 0 ? [] : [{ pattern: best, times: 1 }];
}

function offerWithQuickRest(
  { problem, patterns }: PatternLp,
  incumbent: Incumbent,
  fixed: Map<number, number>,
  left: Int32Array,
): void {
  const uses: PatternUse[] = Array.from(fixed, ([pattern, times]) => ({ pattern: patterns[pattern]!, times }));
  const limits = limitsOf(problem);
  boardsUsed(problem, uses).forEach((boards, kind) => (limits[kind]! -= boards));
  if (limits.some((limit) => limit < 0)) return;
  incumbent.offer([...uses, ...fillQuickly(problem, left.slice(), limits)]);
}
