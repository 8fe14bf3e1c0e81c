import type { UnplacedPart } from '../boards/request';
import { timeIsUp, type RunControl } from '../run-control';
import { buildSheet } from './build-cuts';
import { checkSheetRequest } from './check-request';
import { sheetLowerBound } from './lower-bound';
import type { SheetPlan, SheetRequest } from './request';
import { gatherOffcuts, searchLayouts, type Layouts } from './search-layouts';
import { sheetProblem, type SheetProblem } from './sheet-problem';

const DEFAULT_LIMIT_MS = 1_000;

/**
 * Which sheets to use and how to cut each from edge to edge: least cost first (see {@link SheetRequest} for what cost
 * is), then the largest piece left over.
 *
 * A kerf is lost at each cut and not at a sheet's untouched edge; a part that equals the sheet needs no cut; the kerf of
 * a last cut may run off the edge. The same request and seed give the same plan whenever the run ends by proof.
 *
 * @throws CuttingRequestError when the request makes no sense (a size of zero, a negative kerf)
 */
export function planSheets(request: SheetRequest, control: RunControl<SheetPlan> = {}): SheetPlan {
  checkSheetRequest(request);
  const isTimeUp = timeIsUp(request.timeLimitMs ?? DEFAULT_LIMIT_MS, control);
  const { problem, unplaced } = sheetProblem(request);
  const lowerBound = sheetLowerBound(problem);
  const toPlan = (layouts: Layouts, bound: number): SheetPlan => ({
    sheets: layouts.sheets.map((layout) => buildSheet(layout, problem, request)),
    unplaced: [...unplaced, ...missingParts(layouts)],
    cost: layouts.cost,
    lowerBound: bound,
    proved: layouts.missing.length === 0 && layouts.cost === bound,
  });
  const seed = request.seed ?? 1;
  const { onProgress } = control;
  const best = searchLayouts(problem, seed, lowerBound, isTimeUp, (better) => onProgress?.(toPlan(better, 0)));
  if (best.missing.length > 0) return toPlan(best, boundOfPlaced(problem, best));
  return toPlan({ ...best, sheets: gatherOffcuts(problem, best.sheets, seed, isTimeUp) }, lowerBound);
}

function missingParts({ missing }: Layouts): UnplacedPart[] {
  const counts = new Map<string, number>();
  for (const { pieces } of missing) for (const { id } of pieces) counts.set(id, (counts.get(id) ?? 0) + 1);
  const reason = 'The sheets in the list are used up. Add another sheet, or plan fewer pieces.';
  return [...counts].map(([partId, quantity]) => ({ partId, quantity, reason }));
}

/** Where sheets ran out: what the placed pieces cost at least. */
function boundOfPlaced(problem: SheetProblem, { missing, cost }: Layouts): number {
  const gone = new Set(missing);
  return Math.min(cost, sheetLowerBound({ ...problem, items: problem.items.filter((item) => !gone.has(item)) }));
}
