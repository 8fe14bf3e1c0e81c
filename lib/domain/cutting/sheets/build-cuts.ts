import type { CutDirection, Cut, Placement, PlannedSheet, Rectangle, SheetRequest } from './request';
import type { Laid, SheetLayout, Stack } from './layout';
import type { SheetProblem } from './sheet-problem';

type Make = (region: Rectangle) => Cut;

/**
 * The cuts of a sheet as a tree, its parts' places and what is left. Widest strips come first, so that what is left over
 * lies together at the far edge; the kerf of a last cut may run off the end.
 */
export function buildSheet(layout: SheetLayout, problem: SheetProblem, request: SheetRequest): PlannedSheet {
  const { kerf, trim } = problem;
  const { sheet, direction } = layout.kind;
  const placements: Placement[] = [];
  const offcuts: Rectangle[] = [];
  const other: CutDirection = direction === 'along' ? 'across' : 'along';

  const rest: Make = (region) => {
    if (!isKept(region, request)) return { ...region, kind: 'waste' };
    offcuts.push(region);
    return { ...region, kind: 'offcut' };
  };

  /** Cuts pieces of these sizes (kerf added) off one after the other; what remains is left over. */
  const slice = (along: CutDirection, pieces: readonly { size: number; make: Make }[]): Make => {
    const from = (index: number): Make => {
      return (region) => {
        const piece = pieces[index];
        if (!piece) return rest(region);
        const [one, behind] = cutOff(region, along, piece.size - kerf, kerf);
        if (!one) return piece.make(region);
        const first = piece.make(one);
        return {
          ...region,
          kind: 'cut',
          direction: along,
          at: along === 'along' ? one.y + one.width : one.x + one.length,
          first,
          rest: behind && from(index + 1)(behind),
        };
      };
    };
    return from(0);
  };

  const part = (piece: { id: string; length: number; width: number }, turned: boolean): Make => {
    const [length, width] = turned ? [piece.width, piece.length] : [piece.length, piece.width];
    const leaf: Make = (region) => {
      placements.push({ partId: piece.id, ...region, turned });
      return { ...region, kind: 'part', partId: piece.id, turned };
    };
    // The last trims of a piece, first to the size that its neighbours share.
    return slice('along', [{ size: width + kerf, make: slice('across', [{ size: length + kerf, make: leaf }]) }]);
  };

  const item = ({ item: { pieces, row }, lie, u }: Laid): { size: number; make: Make } => {
    if (row === null) return { size: u, make: part(pieces[0]!, lie.turned) };
    const parts = pieces.map((piece) => {
      const lengthwise = (row === 'x') !== lie.turned;
      return { size: (lengthwise ? piece.length : piece.width) + kerf, make: part(piece, lie.turned) };
    });
    return { size: u, make: slice(other, parts) };
  };

  const stackOf = ({ rows }: Stack): Make => {
    const [only] = rows[0]!.laid;
    // The pieces of a matched row are cut like stacks, each trimmed by itself, so that they take no stage more.
    if (only!.item.row !== null) return item(only!).make;
    const made = rows.map((row) => ({ size: row.v, make: slice(other, row.laid.map(item)) }));
    return slice(direction, made);
  };

  const strips = [...layout.strips]
    .sort((a, b) => b.v - a.v)
    .map((strip) => ({
      size: strip.v,
      make: slice(
        other,
        [...strip.stacks].sort((a, b) => b.v - a.v).map((stack) => ({ size: stack.u, make: stackOf(stack) })),
      ),
    }));
  const whole: Rectangle = { x: 0, y: 0, length: sheet.length, width: sheet.width };
  const cuts = trimmed(whole, trim, kerf, slice(direction, strips));
  offcuts.sort((a, b) => b.length * b.width - a.length * a.width);
  return { sheetId: sheet.id, cuts, placements, offcuts };
}

/** The piece of that size at the near end, and what lies behind the kerf; no piece where the region is no larger. */
function cutOff(
  region: Rectangle,
  direction: CutDirection,
  size: number,
  kerf: number,
): [Rectangle | null, Rectangle | null] {
  const { x, y, length, width } = region;
  if (direction === 'along') {
    if (size >= width) return [null, null];
    const left = width - size - kerf;
    return [{ x, y, length, width: size }, left > 0 ? { x, y: y + size + kerf, length, width: left } : null];
  }
  if (size >= length) return [null, null];
  const left = length - size - kerf;
  return [{ x, y, length: size, width }, left > 0 ? { x: x + size + kerf, y, length: left, width } : null];
}

/** Takes the trim off all four edges first; each trim is waste and a kerf. */
function trimmed(sheet: Rectangle, trim: number, kerf: number, make: Make): Cut {
  if (trim === 0) return make(sheet);
  const waste = Math.max(0, trim - kerf);
  const far =
    (direction: CutDirection, inner: Make): Make =>
    (region) => {
      const size = (direction === 'along' ? region.width : region.length) - trim;
      const [one, behind] = cutOff(region, direction, size, Math.min(kerf, trim));
      const at = direction === 'along' ? region.y + size : region.x + size;
      return {
        ...region,
        kind: 'cut',
        direction,
        at,
        first: inner(one!),
        rest: behind && { ...behind, kind: 'waste' },
      };
    };
  const near =
    (direction: CutDirection, inner: Make): Make =>
    (region) => {
      const { x, y, length, width } = region;
      const first: Rectangle = direction === 'along' ? { x, y, length, width: waste } : { x, y, length: waste, width };
      const kept: Rectangle =
        direction === 'along'
          ? { x, y: y + trim, length, width: width - trim }
          : { x: x + trim, y, length: length - trim, width };
      const at = direction === 'along' ? y + waste : x + waste;
      return {
        ...region,
        kind: 'cut',
        direction,
        at,
        first: waste > 0 ? { ...first, kind: 'waste' } : null,
        rest: inner(kept),
      };
    };
  return near('along', far('along', near('across', far('across', make))))(sheet);
}

function isKept({ length, width }: Rectangle, { keepOffcut }: SheetRequest): boolean {
  if (!keepOffcut) return true;
  return (
    (length >= keepOffcut.length && width >= keepOffcut.width) ||
    (length >= keepOffcut.width && width >= keepOffcut.length)
  );
}
