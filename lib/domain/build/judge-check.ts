import type { Length } from '../measure';
import type { PlanCheck, PlanDocument } from '../plan/document';
import { evaluateSize, type KeySizeValues } from '../plan/key-sizes';

export type CheckJudgement =
  | {
      verdict: 'within' | 'outside';
      /** How far out, or how far apart; 1/640 mm. */ off: Length;
      /** What to do, in words. */ words: string;
    }
  | { verdict: 'incomplete'; words: string };

/**
 * Judges the readings of a check against the plan.
 *
 * `length`: one reading, within `minus` below and `plus` above its target. `difference`: two readings that agree within
 * the tolerance. For two diagonals the longer one says which corners to push together: a rectangle whose opposite sides
 * are equal is square exactly when its diagonals are. `yes` has no readings: the person's word decides.
 */
export function judgeCheck(
  check: PlanCheck,
  readings: readonly Length[],
  values: KeySizeValues,
  plan: PlanDocument,
): CheckJudgement {
  const { judge } = check;
  if (judge.kind === 'yes') return { verdict: 'within', off: 0, words: 'Looked at and found so' };
  if (judge.kind === 'difference') {
    const [first, second] = readings;
    if (first === undefined || second === undefined)
      return { verdict: 'incomplete', words: `Measure ${judge.of[0]} and ${judge.of[1]}` };
    const off = Math.abs(first - second);
    const longer = first > second ? judge.of[0] : judge.of[1];
    // Only a frame is racked square by its diagonals; two sides that differ are cut, not pushed.
    const rack = judge.of.every((name) => /diagonal/i.test(name)) ? ': push its ends towards each other' : '';
    return off <= judge.tolerance
      ? { verdict: 'within', off, words: 'They agree within the tolerance' }
      : { verdict: 'outside', off, words: `${longer} is longer${rack}` };
  }
  const [reading] = readings;
  if (reading === undefined) return { verdict: 'incomplete', words: 'Measure it' };
  const target = evaluateSize(judge.target, values, plan);
  if (!target.ok) return { verdict: 'incomplete', words: `The plan gives no size to check against: ${target.message}` };
  const off = reading - target.length;
  const drawn = target.estimate ? ', held against the size as drawn: measure that from the work first' : '';
  if (off > judge.plus) return { verdict: 'outside', off, words: `Too large${drawn}` };
  if (-off > judge.minus) return { verdict: 'outside', off, words: `Too small${drawn}` };
  return { verdict: 'within', off, words: `Within the tolerance${drawn}` };
}
