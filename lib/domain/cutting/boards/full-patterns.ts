/** Partial patterns looked at for one answer at most. */
const MAX_STEPS = 20_000;

/**
 * The ways to fill a room with the first width given and others after it, so full that nothing wanted fits any more
 * and at least `least` of the room is used; found roughly longest parts first.
 *
 * @param widths  descending
 * @param left    how many of each are wanted; at least one of `first`, none before it
 * @param most    stops when so many were found; `isAll` is then false
 */
export function fullPatterns(
  widths: readonly number[],
  left: Int32Array,
  room: number,
  first: number,
  least: number,
  most: number,
): { found: Int32Array[]; isAll: boolean } {
  const found: Int32Array[] = [];
  const counts = new Int32Array(widths.length);
  let steps = 0;
  // Width that all wanted parts from each place on could add.
  const after = new Float64Array(widths.length + 1);
  for (let i = widths.length - 1; i >= first; i--) after[i] = after[i + 1]! + left[i]! * widths[i]!;
  /** @param skipped the shortest width so far of which more were wanted than taken */
  const visit = (at: number, rest: number, skipped: number): void => {
    steps++;
    let i = at;
    while (i < widths.length && (left[i] === 0 || widths[i]! > rest)) i++;
    if (room - rest + after[i]! < least || skipped <= rest - after[i]!) return;
    if (i === widths.length) {
      if (skipped > rest && room - rest >= least) found.push(counts.slice());
      return;
    }
    const width = widths[i]!;
    const fit = Math.min(left[i]!, Math.floor(rest / width));
    for (let count = fit; count >= (i === first ? 1 : 0) && found.length < most && steps < MAX_STEPS; count--) {
      counts[i] = count;
      visit(i + 1, rest - count * width, count < left[i]! ? Math.min(skipped, width) : skipped);
    }
    counts[i] = 0;
  };
  visit(first, room, Infinity);
  return { found, isAll: found.length < most && steps < MAX_STEPS };
}
