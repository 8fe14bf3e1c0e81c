import type { Length } from '../measure';
import type { PlanDocument } from '../plan/document';
import { namesIn, parseFormula } from '../plan/formula/parse';

/**
 * Part id to the take-from-work sizes that its own sizes are, or are worked out from, and that nobody has measured yet
 * (a length of nothing or less is no measurement); parts that wait for none are left out. A size that is measured on each
 * sheet counts from the first one measured.
 *
 * @param measured  lengths in force, by key size id or `id@piece of stock`
 */
export function unmeasuredSizes(
  plan: PlanDocument,
  measured: Readonly<Record<string, Length>>,
): ReadonlyMap<string, readonly string[]> {
  const taken = Object.keys(measured).filter((key) => measured[key]! > 0);
  const known = new Set(taken.map((key) => key.split('@', 1)[0]!));
  const byId = new Map(plan.keySizes.map((size) => [size.id, size]));
  const roots = new Map<string, readonly string[]>();
  // A size that was measured or chosen hangs on nothing any more. Circles were refused when the plan was read.
  const rootsOf = (id: string): readonly string[] => {
    const found = roots.get(id);
    if (found) return found;
    roots.set(id, []);
    const size = byId.get(id);
    const open =
      !size || known.has(id)
        ? []
        : size.takeFromWork
          ? [id]
          : size.formula
            ? namesOf(size.formula).flatMap(rootsOf)
            : [];
    roots.set(id, [...new Set(open)]);
    return roots.get(id)!;
  };
  const waits = new Map<string, readonly string[]>();
  for (const { id, length, width, thickness } of plan.parts) {
    const open = new Set([length, width, thickness].flatMap(namesOf).flatMap(rootsOf));
    if (open.size > 0) waits.set(id, [...open]);
  }
  return waits;
}

function namesOf(size: number | string): string[] {
  return typeof size === 'string' ? namesIn(parseFormula(size)) : [];
}
