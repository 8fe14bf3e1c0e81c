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
 * The same stretches with at least one kerf between neighbours. Where the wood to avoid is narrower than the kerf, the
 * room is taken from the shorter neighbour, so that the longest stretch of a board stays whole; a stretch that has none
 * left becomes empty. Sharing it out otherwise can, for a defect narrower than the blade, save at most one kerf; bounds
 * are computed without this loss, so a plan is never called proved because of it.
 */
export function keepKerfBetween(stretches: readonly ClearStretch[], kerf: Length): ClearStretch[] {
  const apart = stretches.map((stretch) => ({ ...stretch }));
  const used = [...apart];
  for (let i = 0; i + 1 < used.length;) {
    const [left, right] = [used[i]!, used[i + 1]!];
    const short = kerf - (right.start - left.end);
    if (short <= 0) {
      i++;
      continue;
    }
    const isLeft = left.end - left.start < right.end - right.start;
    if (isLeft) left.end = Math.max(left.start, left.end - short);
    else right.start = Math.min(right.end, right.start + short);
    const shortened = isLeft ? left : right;
    if (shortened.start === shortened.end) {
      used.splice(isLeft ? i : i + 1, 1);
      i = Math.max(0, i - 1);
    }
  }
  return apart;
}
