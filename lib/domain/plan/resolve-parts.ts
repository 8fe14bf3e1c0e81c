import type { Length } from '../measure';
import type { PlanDocument, PlanPart } from './document';
import { evaluateSize, type KeySizeValues } from './key-sizes';

export interface ResolvedPart {
  part: PlanPart;
  length: Length;
  width: Length;
  thickness: Length;
  /** Key sizes that the three are worked out from. */
  uses: string[];
  /** True while one of them is still to be measured from the work. */
  estimate: boolean;
  /** How each was come by. */
  working: { length: string; width: string; thickness: string };
}

/**
 * Finished sizes of every part with these key sizes.
 *
 * @throws RangeError naming the part and what is wrong; a plan that passed readPlan gives none
 */
export function resolveParts(plan: PlanDocument, values: KeySizeValues): ResolvedPart[] {
  return plan.parts.map((part) => {
    const sizes = (['length', 'width', 'thickness'] as const).map((side) => {
      const result = evaluateSize(part[side], values, plan);
      if (!result.ok) throw new RangeError(`${side} of part ${part.id}: ${result.message}`);
      if (result.length <= 0)
        throw new RangeError(`${side} of part ${part.id}: comes to ${result.length}, not above zero`);
      return result;
    });
    const [length, width, thickness] = sizes as [(typeof sizes)[0], (typeof sizes)[0], (typeof sizes)[0]];
    return {
      part,
      length: length.length,
      width: width.length,
      thickness: thickness.length,
      uses: [...new Set(sizes.flatMap(({ uses }) => uses))],
      estimate: sizes.some(({ estimate }) => estimate),
      working: { length: length.working, width: width.working, thickness: thickness.working },
    };
  });
}
