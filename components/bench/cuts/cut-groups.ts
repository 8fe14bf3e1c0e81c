import type { PlanDocument, PlanStock } from '@/lib/domain/plan/document';
import type { ResolvedPart } from '@/lib/domain/plan/resolve-parts';

/** Parts cut from one stock with one section: one setting of fence and thickness serves them all. */
export interface CutGroup {
  stock: PlanStock;
  /** Width and thickness that the parts share; null for sheet parts, which are grouped by stock alone. */
  section: { width: number; thickness: number } | null;
  parts: ResolvedPart[];
}

/**
 * The cut list by stock, then by section, widest first; within a group the longest first, since a long piece spoilt
 * still gives a short one. Parts that are glued up from others are not cut and stand apart.
 */
export function cutGroups(
  plan: PlanDocument,
  parts: ReadonlyMap<string, ResolvedPart>,
): { groups: CutGroup[]; madeUp: ResolvedPart[] } {
  const groups = new Map<string, CutGroup>();
  const madeUp: ResolvedPart[] = [];
  for (const { id, madeFrom } of plan.parts) {
    const resolved = parts.get(id);
    if (!resolved) continue;
    if (madeFrom) {
      madeUp.push(resolved);
      continue;
    }
    const stock = plan.stock.find((each) => each.id === resolved.part.stock);
    if (!stock) continue;
    const section = stock.kind === 'lumber' ? { width: resolved.width, thickness: resolved.thickness } : null;
    const key = `${stock.id} ${section ? `${section.width}x${section.thickness}` : ''}`;
    const group = groups.get(key) ?? { stock, section, parts: [] };
    group.parts.push(resolved);
    groups.set(key, group);
  }
  const order = new Map(plan.stock.map(({ id }, index) => [id, index]));
  const sorted = [...groups.values()].sort(
    (a, b) => order.get(a.stock.id)! - order.get(b.stock.id)! || (b.section?.width ?? 0) - (a.section?.width ?? 0),
  );
  for (const group of sorted) group.parts.sort((a, b) => b.length - a.length || b.width - a.width);
  return { groups: sorted, madeUp };
}

/** Hand of one piece of a part: of a pair, the first half is left-handed. */
export function handOfPiece(part: ResolvedPart['part'], piece: number): 'left' | 'right' | null {
  if (part.hand === 'pair') return piece <= Math.ceil(part.quantity / 2) ? 'left' : 'right';
  return part.hand ?? null;
}
