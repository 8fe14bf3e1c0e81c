import type { UnplacedPart } from '../boards/request';
import type { CutDirection, GrainWish, SheetPart, SheetRequest, SheetStock } from './request';

/**
 * A sheet as the search sees it: strips run along u and lie side by side along v. For a first cut across, u is the
 * sheet's width. One kerf is added to both sides, as to every piece, so that kerfs need no thought while packing.
 */
export interface SheetKind {
  sheet: SheetStock;
  /** Index of the sheet in the request; kinds of one sheet share what is available. */
  stock: number;
  direction: CutDirection;
  u: number;
  v: number;
  cost: number;
}

/** A way to lay an item: its extent with one kerf added, in the sheet's own terms. */
export interface Lie {
  /** Along x and y of the sheet. */
  x: number;
  y: number;
  turned: boolean;
  /** Against the wish about the grain, so only on a sheet that says it has none. */
  freeOnly: boolean;
}

/** One piece, or a matched row of pieces that stays together. */
export interface Item {
  index: number;
  pieces: readonly SheetPart[];
  /** Which way the pieces of a row follow one another; null for a single piece. */
  row: 'x' | 'y' | null;
  lies: readonly Lie[];
  /** With kerfs, square units. */
  area: number;
}

export interface SheetProblem {
  kinds: SheetKind[];
  items: Item[];
  /** How many of each sheet of the request there are. */
  available: number[];
  kerf: number;
  trim: number;
  rowsInStack: number;
  itemsInRow: number;
}

/**
 * The problem in the terms of the search, and the parts that no sheet can hold with the reason.
 *
 * A part with a wish about the grain keeps it unless the sheet says that it has none. Rows of matched pieces lie along
 * the grain where they fit, else across it.
 */
export function sheetProblem(request: SheetRequest): { problem: SheetProblem; unplaced: UnplacedPart[] } {
  const { kerf, trim = 0, stages = 3, firstCut = 'either' } = request;
  const priced = request.sheets.some(({ price }) => price !== undefined);
  const directions: CutDirection[] = firstCut === 'either' ? ['along', 'across'] : [firstCut];
  const usable = request.sheets.map((sheet, stock) => ({
    sheet,
    stock,
    x: sheet.length - 2 * trim + kerf,
    y: sheet.width - 2 * trim + kerf,
    cost: priced ? (sheet.price ?? 0) : sheet.length * sheet.width,
  }));
  const kinds = usable
    .filter(({ sheet, x, y }) => sheet.available !== 0 && x > kerf && y > kerf)
    .flatMap(({ sheet, stock, x, y, cost }) =>
      directions.map((direction): SheetKind => {
        const [u, v] = direction === 'along' ? [x, y] : [y, x];
        return { sheet, stock, direction, u, v, cost };
      }),
    );
  const unplaced: UnplacedPart[] = [];
  const items: Item[] = [];
  const add = (pieces: readonly SheetPart[], row: Item['row'], lies: Lie[]) =>
    items.push({ index: items.length, pieces, row, lies, area: lies[0]!.x * lies[0]!.y });
  const fits = (lie: Lie) => kinds.some((kind) => fitsKind(lie, kind));

  for (const part of request.parts) {
    if (part.matched !== undefined || part.quantity === 0) continue;
    const wish = part.grain ?? 'any';
    const lies = liesOf(part, kerf, wish).filter(fits);
    if (lies.length === 0) {
      unplaced.push({ partId: part.id, quantity: part.quantity, reason: whyNot(part, kinds, kerf) });
      continue;
    }
    for (let piece = 0; piece < part.quantity; piece += 1) add([part], null, lies);
  }
  for (const group of matchedGroups(request.parts)) {
    const row = rowLies(group, kerf, (lie, along) =>
      // A row that ran across the strips would be cut a stage later than its stack.
      kinds.some((kind) => (kind.direction === 'along') === along && fitsKind(lie, kind)),
    );
    if (row) add(group, row.row, row.lies);
    else unplaced.push(...groupUnplaced(group));
  }
  const available = request.sheets.map(({ available: count }) => count ?? Infinity);
  return {
    problem: {
      kinds,
      items,
      available,
      kerf,
      trim,
      rowsInStack: stages === 2 ? 1 : Infinity,
      itemsInRow: stages === 4 ? Infinity : 1,
    },
    unplaced,
  };
}

/** Whether a lie has room on a sheet and its grain. */
export function fitsKind({ x, y, freeOnly }: Lie, { sheet, direction, u, v }: SheetKind): boolean {
  if (freeOnly && sheet.grain !== false) return false;
  return direction === 'along' ? x <= u && y <= v : x <= v && y <= u;
}

function liesOf(part: SheetPart, kerf: number, wish: GrainWish): Lie[] {
  const [x, y] = [part.length + kerf, part.width + kerf];
  const straight = { x, y, turned: false, freeOnly: wish === 'across' };
  const turned = { x: y, y: x, turned: true, freeOnly: wish === 'along' };
  return wish === 'any' && x === y ? [straight] : [straight, turned];
}

/** Pieces of each matched group, in the order of the list. */
function matchedGroups(parts: readonly SheetPart[]): SheetPart[][] {
  const groups = new Map<string, SheetPart[]>();
  for (const part of parts) {
    if (part.matched === undefined || part.quantity === 0) continue;
    const pieces = groups.get(part.matched) ?? [];
    pieces.push(...Array.from({ length: part.quantity }, () => part));
    groups.set(part.matched, pieces);
  }
  return [...groups.values()];
}

/** How a matched row may lie; all its pieces one way round. Null where it fits no sheet, or its wishes contradict. */
function rowLies(
  group: readonly SheetPart[],
  kerf: number,
  fits: (lie: Lie, alongStrips: boolean) => boolean,
): { row: 'x' | 'y'; lies: Lie[] } | null {
  const wishes = new Set(group.map(({ grain = 'any' }) => grain).filter((grain) => grain !== 'any'));
  if (wishes.size > 1) return null;
  const [wish = 'any'] = wishes;
  for (const row of ['x', 'y'] as const) {
    const lies = [false, true].map((turned): Lie => {
      const freeOnly = wish !== 'any' && turned !== (wish === 'across');
      const xs = group.map(({ length, width }) => (turned ? width : length) + kerf);
      const ys = group.map(({ length, width }) => (turned ? length : width) + kerf);
      const sum = (sizes: number[]) => sizes.reduce((total, size) => total + size, 0);
      return row === 'x'
        ? { x: sum(xs), y: Math.max(...ys), turned, freeOnly }
        : { x: Math.max(...xs), y: sum(ys), turned, freeOnly };
    });
    const fitting = lies.filter((lie) => fits(lie, row === 'x'));
    if (fitting.length > 0) return { row, lies: fitting };
  }
  return null;
}

function groupUnplaced(group: readonly SheetPart[]): UnplacedPart[] {
  const wishes = new Set(group.map(({ grain = 'any' }) => grain).filter((grain) => grain !== 'any'));
  const reason =
    wishes.size > 1
      ? 'The pieces of its matched group want the grain in different ways. Give them one wish, or take it out of the group.'
      : 'Its matched group does not fit side by side on any sheet. Use a larger sheet, or split the group.';
  return [...new Set(group)].map(({ id, quantity }) => ({ partId: id, quantity, reason }));
}

function whyNot(part: SheetPart, kinds: readonly SheetKind[], kerf: number): string {
  if (kinds.length === 0) return 'There is no sheet to cut it from. Add sheets.';
  const turnable = liesOf(part, kerf, 'any').some((lie) => kinds.some((kind) => fitsKind(lie, kind)));
  return turnable
    ? 'It fits a sheet only when turned against the grain it wants. Allow it to be turned, or use a larger sheet.'
    : 'It is larger than every sheet once the edges are trimmed. Use a larger sheet, or make the part in pieces.';
}
