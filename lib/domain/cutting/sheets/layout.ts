import type { Item, Lie, SheetKind } from './sheet-problem';

/** An item where it lies: extents along u and v, one kerf added. */
export interface Laid {
  item: Item;
  lie: Lie;
  u: number;
  v: number;
}

/** Items side by side along u in a stack; as high as its highest. */
export interface Row {
  laid: Laid[];
  u: number;
  v: number;
}

/** Rows one above the other in a strip; as wide as its widest. */
export interface Stack {
  rows: Row[];
  u: number;
  /** Height of all rows. */
  v: number;
}

/** Stacks side by side over the sheet's whole u; as high as its highest. */
export interface Strip {
  stacks: Stack[];
  u: number;
  v: number;
}

/**
 * One sheet as strips of stacks of rows: whatever is built so can be cut from edge to edge in at most three changes of
 * direction (strips, stacks, rows; items of a row take a fourth), and every item is trimmed to size at the end.
 */
export interface SheetLayout {
  kind: SheetKind;
  strips: Strip[];
  /** Height of all strips. */
  v: number;
  /** Area of the items, with kerfs. */
  filled: number;
}

export const emptySheet = (kind: SheetKind): SheetLayout => ({ kind, strips: [], v: 0, filled: 0 });

export function copySheet(sheet: SheetLayout): SheetLayout {
  return { ...sheet, strips: sheet.strips.map(copyStrip) };
}

function copyStrip(strip: Strip): Strip {
  return {
    u: strip.u,
    v: strip.v,
    stacks: strip.stacks.map((stack) => ({
      u: stack.u,
      v: stack.v,
      rows: stack.rows.map((row) => ({ u: row.u, v: row.v, laid: row.laid.slice() })),
    })),
  };
}

/** Items of a sheet. */
export function itemsOf(sheet: SheetLayout): Item[] {
  const items: Item[] = [];
  for (const strip of sheet.strips)
    for (const stack of strip.stacks) for (const row of stack.rows) for (const { item } of row.laid) items.push(item);
  return items;
}

/** Takes every item that `goes` names off a sheet, in place, and closes up what is left. */
export function takeOff(sheet: SheetLayout, goes: (item: Item, strip: number, stack: number) => boolean): Item[] {
  const taken: Item[] = [];
  sheet.strips.forEach((strip, s) => {
    strip.stacks.forEach((stack, t) => {
      for (const row of stack.rows) {
        row.laid = row.laid.filter(({ item }) => {
          if (!goes(item, s, t)) return true;
          taken.push(item);
          return false;
        });
      }
    });
  });
  if (taken.length > 0) closeUp(sheet);
  return taken;
}

function closeUp(sheet: SheetLayout): void {
  let filled = 0;
  for (const strip of sheet.strips) {
    for (const stack of strip.stacks) {
      stack.rows = stack.rows.filter(({ laid }) => laid.length > 0);
      stack.u = 0;
      stack.v = 0;
      for (const row of stack.rows) {
        row.u = 0;
        row.v = 0;
        for (const { u, v, item } of row.laid) {
          row.u += u;
          row.v = Math.max(row.v, v);
          filled += item.area;
        }
        stack.u = Math.max(stack.u, row.u);
        stack.v += row.v;
      }
    }
    strip.stacks = strip.stacks.filter(({ rows }) => rows.length > 0);
    strip.u = 0;
    strip.v = 0;
    for (const stack of strip.stacks) {
      strip.u += stack.u;
      strip.v = Math.max(strip.v, stack.v);
    }
  }
  sheet.strips = sheet.strips.filter(({ stacks }) => stacks.length > 0);
  sheet.v = sheet.strips.reduce((sum, { v }) => sum + v, 0);
  sheet.filled = filled;
}
