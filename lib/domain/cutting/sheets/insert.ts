import type { Laid, SheetLayout, Stack, Strip } from './layout';
import type { Item, SheetProblem } from './sheet-problem';

/** How an insertion weighs what it spoils; varied at random, so that the search sees other layouts too. */
export interface Weights {
  /** Room left over an item that does not fill its strip's height. */
  above: number;
  /** Room left beside a new strip's first item. */
  beside: number;
  /** Share of places that are passed over at random. */
  passOver: number;
  /** The rest of a sheet over a new strip: more, and sheets that are nearly full are filled first. */
  rest: number;
}

/** A place for an item. `stack` and `row` are null where a new one begins; `strip` too. */
interface Place {
  sheet: number;
  strip: Strip | null;
  stack: Stack | null;
  row: number;
  laid: Laid;
}

/**
 * The best place for an item on these sheets: the one that spoils the least area. Null where there is none.
 *
 * Strips and stacks may grow where the sheet has room; a matched row of pieces always has a stack to itself.
 */
export function bestPlace(
  item: Item,
  sheets: readonly SheetLayout[],
  from: number,
  problem: SheetProblem,
  weights: Weights,
  random: () => number,
): Place | null {
  let best: Place | null = null;
  let least = Infinity;
  const take = (spoilt: number, sheet: number, strip: Strip | null, stack: Stack | null, row: number, laid: Laid) => {
    if (spoilt >= least || (weights.passOver > 0 && random() < weights.passOver)) return;
    least = spoilt;
    best = { sheet, strip, stack, row, laid };
  };
  for (let s = from; s < sheets.length; s += 1) {
    const sheet = sheets[s]!;
    const { u: mostU, v: mostV, direction } = sheet.kind;
    // Nothing of this size is left anywhere on it.
    if (mostU * mostV - sheet.filled < item.area) continue;
    for (const lie of item.lies) {
      if (lie.freeOnly && sheet.kind.sheet.grain !== false) continue;
      const [u, v] = direction === 'along' ? [lie.x, lie.y] : [lie.y, lie.x];
      if (u > mostU || v > mostV) continue;
      const spareV = mostV - sheet.v;
      // A matched row that runs across the strips would have to be cut a stage later than its stack.
      if (item.row !== null && (item.row === 'x') !== (direction === 'along')) continue;
      const laid = { item, lie, u, v };
      for (const strip of sheet.strips) {
        const spareU = mostU - strip.u;
        if (spareU >= u) {
          const raise = v - strip.v;
          if (raise <= 0) take(-raise * u * weights.above, s, strip, null, 0, laid);
          else if (raise <= spareV) take(raise * strip.u, s, strip, null, 0, laid);
        }
        if (item.row !== null) continue;
        for (const stack of strip.stacks) {
          if (stack.rows[0]!.laid[0]!.item.row !== null) continue;
          const widen = u - stack.u;
          if (widen <= spareU && stack.rows.length < problem.rowsInStack) {
            const raise = stack.v + v - strip.v;
            const spoilt = widen <= 0 ? -widen * v : widen * stack.v;
            if (raise <= 0) take(spoilt, s, strip, stack, -1, laid);
            else if (raise <= spareV) take(spoilt + raise * (strip.u - stack.u), s, strip, stack, -1, laid);
          }
          if (problem.itemsInRow > 1)
            beside(stack, strip, laid, (row, spoilt) => take(spoilt, s, strip, stack, row, laid));
        }
      }
      if (spareV >= v) take((mostU - u) * v * weights.beside + (spareV - v) * weights.rest, s, null, null, 0, laid);
    }
  }
  return best;
}

/** Places beside the items of a row, within the stack as it is. */
function beside(stack: Stack, strip: Strip, { u, v }: Laid, found: (row: number, spoilt: number) => void): void {
  stack.rows.forEach((row, index) => {
    if (row.u + u > stack.u) return;
    const raise = v - row.v;
    if (raise <= 0) found(index, -raise * u);
    else if (stack.v + raise <= strip.v) found(index, raise * row.u);
  });
}

/** Lays an item where {@link bestPlace} said, in place. */
export function layAt(sheet: SheetLayout, { strip, stack, row, laid }: Place): void {
  const { u, v, item } = laid;
  sheet.filled += item.area;
  if (!strip) {
    sheet.strips.push({ u, v, stacks: [{ u, v, rows: [{ u, v, laid: [laid] }] }] });
    sheet.v += v;
    return;
  }
  if (!stack) {
    strip.stacks.push({ u, v, rows: [{ u, v, laid: [laid] }] });
    strip.u += u;
    raiseStrip(sheet, strip, v);
    return;
  }
  if (row >= 0) {
    const held = stack.rows[row]!;
    held.laid.push(laid);
    held.u += u;
    if (v > held.v) {
      stack.v += v - held.v;
      held.v = v;
    }
  } else {
    stack.rows.push({ u, v, laid: [laid] });
    stack.v += v;
    if (u > stack.u) {
      strip.u += u - stack.u;
      stack.u = u;
    }
  }
  raiseStrip(sheet, strip, stack.v);
}

function raiseStrip(sheet: SheetLayout, strip: Strip, v: number): void {
  if (v <= strip.v) return;
  sheet.v += v - strip.v;
  strip.v = v;
}
