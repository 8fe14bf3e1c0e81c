import type { PlanDocument, PlanKeySize } from '@/lib/domain/plan/document';
import { namesIn, parseFormula } from '@/lib/domain/plan/formula/parse';

/** Take-from-work key sizes that the given ones are, or are worked out from, each once. */
export function takenSizes(plan: PlanDocument, keySizeIds: readonly string[]): PlanKeySize[] {
  const byId = new Map(plan.keySizes.map((size) => [size.id, size]));
  const seen = new Set<string>();
  const found: PlanKeySize[] = [];
  const waiting = [...keySizeIds];
  for (let id = waiting.pop(); id !== undefined; id = waiting.pop()) {
    const size = byId.get(id);
    if (!size || seen.has(id)) continue;
    seen.add(id);
    if (size.takeFromWork) found.push(size);
    else if (size.formula) waiting.push(...namesIn(parseFormula(size.formula)));
  }
  return found;
}
