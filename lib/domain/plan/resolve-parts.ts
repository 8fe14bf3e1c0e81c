import type { Length } from '../measure';
import type { PlanDocument, PlanPart } from './document';
import { evaluateSize, resolveKeySizes, type KeySizeValues, type SizeResult } from './key-sizes';

export interface ResolvedPart {
  part: PlanPart;
  length: Length;
  width: Length;
  thickness: Length;
  /** Key sizes that the three are worked out from. */
  uses: string[];
  /** True while one of them is still to be measured from the work. */
  estimate: boolean;
  /** How each was come by, in words. */
  working: { length: string; width: string; thickness: string };
  /** What is wrong with the measurements it depends on; the size is then the one as drawn, and an estimate. */
  problem?: string;
}

type Side = 'length' | 'width' | 'thickness';

/**
 * Finished sizes of every part with these key sizes. Where the measurements leave a part with nothing or less, it keeps
 * its size as drawn, marked as an estimate, with the problem said.
 *
 * @throws RangeError naming the part, for a plan that did not pass readPlan
 */
export function resolveParts(plan: PlanDocument, values: KeySizeValues): ResolvedPart[] {
  const drawn = resolveKeySizes(plan, {});
  const drawnValues = drawn.ok ? drawn.values : values;
  return plan.parts.map((part) => {
    let problem: string | undefined;
    const sizeOf = (side: Side): SizeResult & { ok: true } => {
      const result = evaluateSize(part[side], values, plan);
      if (result.ok && result.length > 0) return result;
      const fault = result.ok ? 'it comes to nothing or less' : result.message;
      const asDrawn = evaluateSize(part[side], drawnValues, plan);
      if (!asDrawn.ok || asDrawn.length <= 0) throw new RangeError(`${side} of part ${part.id}: ${fault}`);
      problem ??= `With these measurements the ${side} of ${part.label} has no size: ${fault}`;
      return { ...asDrawn, estimate: true };
    };
    const length = sizeOf('length');
    const width = sizeOf('width');
    const thickness = sizeOf('thickness');
    const sides = [length, width, thickness];
    return {
      part,
      length: length.length,
      width: width.length,
      thickness: thickness.length,
      uses: [...new Set(sides.flatMap(({ uses }) => uses))],
      estimate: sides.some(({ estimate }) => estimate),
      working: { length: length.working, width: width.working, thickness: thickness.working },
      ...(problem === undefined ? {} : { problem }),
    };
  });
}
