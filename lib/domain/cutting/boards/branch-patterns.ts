import { enumeratePatterns } from './enumerate-patterns';
import type { Incumbent } from './incumbent';
import { PatternLp, ROUNDING_MARGIN } from './pattern-lp';
import type { PatternUse } from './pattern';
import type { TimeIsUp } from '../run-control';

const WHOLE = 1e-5;

/**
 * Every pattern that a plan cheaper than the best can use: those whose reduced cost is within the gap between the bound
 * and the best cost.
 *
 * @returns undefined when there are more than `most`
 */
export function patternsWithinGap(relaxation: PatternLp, incumbent: Incumbent, most: number): PatternLp | undefined {
  const { problem } = relaxation;
  const { worths, bound, slotWorths } = relaxation.rootDuals;
  const slack = incumbent.best.cost - 1 - bound + ROUNDING_MARGIN;
  const all = new PatternLp(problem, relaxation.most);
  let room = most;
  for (let slot = 0; slot < problem.slots.length; slot++) {
    const patterns = enumeratePatterns(problem, slot, worths, slotWorths[slot]! - slack, room);
    if (!patterns) return undefined;
    room -= patterns.length;
    for (const pattern of patterns) all.add(pattern);
  }
  return all;
}

/** What a branch search came to. */
export type BranchEnd = 'searched' | 'stopped';

/**
 * Branch and bound over a given set of patterns: first on the number of boards of a kind, then on how often a pattern is
 * used, nearest and upward first. Each node is bounded by {@link PatternLp.boundOfNode}, not by the solver's word.
 */
export function branch(all: PatternLp, incumbent: Incumbent, mostNodes: number, isTimeUp: TimeIsUp): BranchEnd {
  const { lp, problem } = all;
  let nodes = 0;
  /** False when the search was stopped. */
  const visit = (): boolean => {
    if (++nodes > mostNodes || isTimeUp()) return false;
    const solved = lp.solve(isTimeUp);
    if (!solved && isTimeUp()) return false;
    if (incumbent.isBeaten(all.boundOfNode())) return true;
    if (!solved) return false;
    const at = branchingColumn();
    if (at < 0) {
      offer();
      return incumbent.isBeaten(all.boundOfNode());
    }
    const value = lp.valueOf(at);
    const lower = lp.lowerOf(at);
    const upper = lp.upperOf(at);
    const down = Math.floor(value);
    const isUpFirst = at >= all.patternColumn(0) || value - down > 0.4;
    for (const up of isUpFirst ? [true, false] : [false, true]) {
      lp.setBounds(at, up ? down + 1 : lower, up ? upper : down);
      const done = visit();
      lp.setBounds(at, lower, upper);
      if (!done) return false;
      if (incumbent.isProved) return true;
    }
    return true;
  };
  const branchingColumn = (): number => {
    let best = -1;
    let most = WHOLE;
    for (let kind = 0; kind < problem.kinds.length; kind++) {
      const column = all.kindColumn(kind);
      const value = lp.valueOf(column);
      const distance = Math.abs(value - Math.round(value));
      if (distance > most) {
        most = distance;
        best = column;
      }
    }
    if (best >= 0) return best;
    for (let pattern = 0; pattern < all.patterns.length; pattern++) {
      const column = all.patternColumn(pattern);
      const value = lp.valueOf(column);
      const share = value - Math.floor(value + WHOLE);
      if (share > most) {
        most = share;
        best = column;
      }
    }
    return best;
  };
  const offer = () => {
    const uses: PatternUse[] = [];
    all.patterns.forEach((pattern, p) => {
      const times = Math.round(lp.valueOf(all.patternColumn(p)));
      if (times > 0) uses.push({ pattern, times });
    });
    incumbent.offer(uses);
  };
  return visit() ? 'searched' : 'stopped';
}
