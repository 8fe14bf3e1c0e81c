import type { Length } from '@/lib/domain/measure';
import { timeIsUp, type RunControl, type TimeIsUp } from '../run-control';
import type { UnplacedPart } from '../boards/request';
import { buildSheet } from '../sheets/build-cuts';
import { sheetLowerBound } from '../sheets/lower-bound';
import type { SheetRequest } from '../sheets/request';
import { searchLayouts, type Layouts } from '../sheets/search-layouts';
import { sheetProblem, type SheetProblem } from '../sheets/sheet-problem';
import { checkRipRequest } from './check-rip-request';
import type { RipPart, RipPlan, RipRequest } from './request';
import { trueCuts } from './true-cuts';

const DEFAULT_LIMIT_MS = 1_000;

interface Way {
  order: RipPlan['order'];
  straighten: Length;
  planned: SheetRequest;
  problem: SheetProblem;
  layouts: Layouts;
}

/**
 * Which boards to rip and crosscut for these parts at least cost, and in which order.
 *
 * An edge is straightened before it runs along the fence, which takes the crook off the width. Crook grows with the square
 * of the length (1/2 in over 96 in is 1/8 in over 48 in, the geometry of a circular arc), so boards that are roughly
 * crosscut first lose less: both orders are planned and the cheaper kept, crosscut first where they cost the same. For
 * crosscut first the loss is that of the longest part, so no piece is planned straighter than it may be.
 *
 * It is a plan, not a promise: wood that moves more than `oversize` allows does not clean up. Whether a rip may pinch is
 * told by its length alone.
 *
 * @throws CuttingRequestError when the request makes no sense (a size of zero, a negative kerf)
 */
export function planRips(request: RipRequest, control: RunControl<RipPlan> = {}): RipPlan {
  checkRipRequest(request);
  const limit = request.timeLimitMs ?? DEFAULT_LIMIT_MS;
  const longest = (lengths: readonly { length: Length }[]) => Math.max(0, ...lengths.map(({ length }) => length));
  const lossOver = (length: Length) => straightening(request, length);
  const orders = [
    { order: 'crosscut-first', straighten: lossOver(longest(request.parts)) },
    { order: 'rip-first', straighten: lossOver(longest(request.boards)) },
  ] as const;
  const { fitting, unplaced } = sortOut(request, Math.min(...orders.map(({ straighten }) => straighten)));
  // The least that any piece loses, so that the bound holds whatever is crosscut first.
  const least = lossOver(Math.min(longest(request.parts), ...request.parts.map(({ length }) => length)));
  const bound = sheetLowerBound(inflated(request, fitting, least, 'either').problem);

  const now = control.now ?? (() => performance.now());
  const started = now();
  let best: Way | null = null;
  for (const { order, straighten } of orders) {
    // Half of the time for each order; the second has what the first left over.
    const mayTake = best === null ? limit / 2 : limit - (now() - started);
    const way = planned(request, fitting, order, straighten, bound, timeIsUp(mayTake, control));
    if (best === null || isBetter(way, best)) best = way;
    if (best.layouts.missing.length === 0 && best.layouts.cost === bound) break;
  }
  const plan = toPlan(request, best!, unplaced, bound);
  control.onProgress?.(plan);
  return plan;
}

/** Width that straightening one edge of a piece this long takes, rounded up. */
export function straightening({ crook }: Pick<RipRequest, 'crook'>, length: Length): Length {
  return crook ? Math.ceil(crook.by * (length / crook.over) ** 2) : 0;
}

function planned(
  request: RipRequest,
  parts: RipPart[],
  order: RipPlan['order'],
  straighten: Length,
  bound: number,
  isTimeUp: TimeIsUp,
): Way {
  const made = inflated(request, parts, straighten, order === 'rip-first' ? 'along' : 'across');
  // What is too wide for boards that are straightened whole has no place in this order.
  const placed = new Set(made.problem.items.map(({ pieces }) => pieces[0]!.id));
  const layouts = searchLayouts(made.problem, request.seed ?? 1, bound, isTimeUp, () => {});
  const tooWide = inflated(request, parts, 0, 'either').problem.items.filter(
    ({ pieces }) => !placed.has(pieces[0]!.id),
  );
  return { order, straighten, ...made, layouts: { ...layouts, missing: [...layouts.missing, ...tooWide] } };
}

/** As sheets without kerf: one kerf is added to every side of each part and board instead, each saw's own. */
function inflated(
  request: RipRequest,
  parts: readonly RipPart[],
  straighten: Length,
  firstCut: NonNullable<SheetRequest['firstCut']>,
): { planned: SheetRequest; problem: SheetProblem } {
  const { ripKerf, crosscutKerf, squareEnds = 0, easedEdge = 0, oversize = 0 } = request;
  const planned: SheetRequest = {
    sheets: request.boards.map(({ id, length, width, available }) => ({
      id,
      length: length - 2 * squareEnds + crosscutKerf,
      width: width - 2 * easedEdge - straighten + ripKerf,
      grain: true,
      ...(available === undefined ? {} : { available }),
    })),
    parts: parts.map(({ id, length, width, quantity }) => ({
      id,
      length: length + crosscutKerf,
      width: width + oversize + ripKerf,
      quantity,
      grain: 'along',
    })),
    kerf: 0,
    stages: 3,
    firstCut,
  };
  const { problem } = sheetProblem(planned);
  const isPriced = request.boards.some(({ price }) => price !== undefined);
  const kinds = problem.kinds.map((kind) => {
    const { length, width, price = 0 } = request.boards[kind.stock]!;
    return { ...kind, cost: isPriced ? price : length * width };
  });
  return { planned, problem: { ...problem, kinds } };
}

function isBetter(a: Way, b: Way): boolean {
  const missing = ({ layouts }: Way) => layouts.missing.reduce((sum, { area }) => sum + area, 0);
  return missing(a) < missing(b) || (missing(a) === missing(b) && a.layouts.cost < b.layouts.cost);
}

function toPlan(request: RipRequest, way: Way, unplaced: UnplacedPart[], bound: number): RipPlan {
  const { order, straighten, planned: asSheets, problem, layouts } = way;
  const { squareEnds = 0, easedEdge = 0, ripKerf, crosscutKerf } = request;
  const from = { x: squareEnds, y: easedEdge + straighten };
  const boards = layouts.sheets.map((layout) => {
    const { sheetId, cuts } = buildSheet(layout, problem, asSheets);
    const usable = { ...from, length: cuts.length - crosscutKerf, width: cuts.width - ripKerf };
    return { boardId: sheetId, usable, ...trueCuts(cuts, from, request) };
  });
  const missing = new Map<string, number>();
  for (const { pieces } of layouts.missing) missing.set(pieces[0]!.id, (missing.get(pieces[0]!.id) ?? 0) + 1);
  const reason = 'The boards in the list are used up. Add another board, or plan fewer pieces.';
  const left = [...missing].map(([partId, quantity]) => ({ partId, quantity, reason }));
  const lowerBound = left.length === 0 ? bound : 0;
  return {
    order,
    straighten,
    boards,
    unplaced: [...unplaced, ...left],
    cost: layouts.cost,
    lowerBound,
    proved: left.length === 0 && layouts.cost === lowerBound,
  };
}

/** Parts that some board can hold, and why the others cannot be had. */
function sortOut(request: RipRequest, straighten: Length): { fitting: RipPart[]; unplaced: UnplacedPart[] } {
  const { squareEnds = 0, easedEdge = 0, oversize = 0, leastStrip = 0 } = request;
  const boards = request.boards.filter(({ available }) => available !== 0);
  const fitting: RipPart[] = [];
  const unplaced: UnplacedPart[] = [];
  for (const part of request.parts) {
    if (part.quantity === 0) continue;
    const width = part.width + oversize;
    const isLongEnough = boards.filter(({ length }) => part.length <= length - 2 * squareEnds);
    const refuse = (reason: string) => unplaced.push({ partId: part.id, quantity: part.quantity, reason });
    if (boards.length === 0) refuse('There is no board to cut it from. Add stock.');
    else if (width < leastStrip)
      refuse(
        'It is narrower than the narrowest strip you rip. Leave more on for the rough rip, or cut it another way.',
      );
    else if (isLongEnough.length === 0)
      refuse(
        'It is longer than every board once the ends are squared. Add a longer board, or make the part in pieces.',
      );
    else if (isLongEnough.every((board) => width > board.width - 2 * easedEdge - straighten))
      refuse('It is wider than every board once the edges are straight. Add a wider board, or glue the part up.');
    else fitting.push(part);
  }
  return { fitting, unplaced };
}
