import type { Length } from '@/lib/domain/measure';
import type { BoardStock } from './request';

export interface ClearStretch {
  start: Length;
  end: Length;
}

/**
 * The stretches of a board in which parts may lie, in order along it: between the trimmed ends, without the stretches to
 * avoid. Stretches shorter than `shortest` are left out, since no part fits them.
 *
 * A part may touch the edge of an avoided stretch: the cut that frees it loses its kerf inside the avoided wood. Where
 * that wood is narrower than the kerf, the cut would eat into the neighbour; {@link keepKerfBetween} sees to it.
 */
export function clearStretches(
  stock: BoardStock,
  trimStart: Length,
  trimEnd: Length,
  shortest: Length,
): ClearStretch[] {
  const last = stock.length - trimEnd;
  const stretches: ClearStretch[] = [];
  let start = trimStart;
  for (const avoided of [...(stock.avoid ?? [])].sort((a, b) => a.start - b.start)) {
    if (avoided.end <= start) continue;
    stretches.push({ start, end: Math.min(avoided.start, last) });
    start = avoided.end;
  }
  stretches.push({ start, end: last });
  return stretches.filter(({ start: from, end }) => end - from >= shortest && end > from);
}

/**
 * The same stretches with at least one kerf between neighbours. The room is taken from the later stretch. Splitting it
 * otherwise can, for a defect narrower than the blade, save at most one kerf; bounds are computed without this loss, so
 * a plan is never called proved because of it.
 */
export function keepKerfBetween(stretches: ClearStretch[], kerf: Length): ClearStretch[] {
  let free = Number.NEGATIVE_INFINITY;
  return stretches.map(({ start, end }) => {
    const from = Math.max(start, free);
    free = Math.max(end, from) + kerf;
    return { start: from, end: Math.max(end, from) };
  });
}
