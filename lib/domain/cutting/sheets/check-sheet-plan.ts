import type { Cut, CutDirection, PlannedSheet, Rectangle, SheetPlan, SheetRequest } from './request';

/**
 * Looks at a plan anew, knowing nothing of how it was made: every cut runs from edge to edge and loses its kerf, the
 * stages and the first direction are kept, parts have their size, grain and number, sheets their number and price.
 *
 * @returns what is wrong, in words; empty for a plan that can be cut as it stands
 */
export function checkSheetPlan(request: SheetRequest, plan: SheetPlan): string[] {
  const faults: string[] = [];
  const placed = new Map<string, number>();
  plan.sheets.forEach((sheet, index) => {
    const named = (fault: string) => faults.push(`Sheet ${index + 1}: ${fault}`);
    checkSheet(request, sheet, named);
    for (const { partId } of sheet.placements) placed.set(partId, (placed.get(partId) ?? 0) + 1);
  });
  const unplaced = new Map<string, number>();
  for (const { partId, quantity } of plan.unplaced) unplaced.set(partId, (unplaced.get(partId) ?? 0) + quantity);
  for (const { id, quantity } of request.parts) {
    const sum = (placed.get(id) ?? 0) + (unplaced.get(id) ?? 0);
    if (sum !== quantity) faults.push(`Part ${id}: ${sum} of ${quantity} are accounted for.`);
  }
  const priced = request.sheets.some(({ price }) => price !== undefined);
  let cost = 0;
  for (const stock of request.sheets) {
    const used = plan.sheets.filter(({ sheetId }) => sheetId === stock.id).length;
    if (used > (stock.available ?? Infinity)) faults.push(`Sheet ${stock.id}: more are used than there are.`);
    cost += used * (priced ? (stock.price ?? 0) : stock.length * stock.width);
  }
  if (cost !== plan.cost) faults.push(`The cost is ${cost} and said to be ${plan.cost}.`);
  if (plan.lowerBound > plan.cost) faults.push('The lower bound lies over the cost.');
  if (plan.proved && plan.lowerBound !== plan.cost) faults.push('It is called proved, and its bound is lower.');
  checkMatched(request, plan, faults);
  return faults;
}

function checkSheet(request: SheetRequest, sheet: PlannedSheet, fault: (words: string) => void): void {
  const stock = request.sheets.find(({ id }) => id === sheet.sheetId);
  if (!stock) return fault(`there is no sheet “${sheet.sheetId}”.`);
  const { trim = 0, stages = 3, firstCut = 'either', kerf } = request;
  const whole = { x: 0, y: 0, length: stock.length, width: stock.width };
  if (!isSame(sheet.cuts, whole)) fault('the first region is not the whole sheet.');
  const leaves: (Rectangle & { partId: string; turned: boolean })[] = [];
  const usable = { x: trim, y: trim, length: stock.length - 2 * trim, width: stock.width - 2 * trim };

  const visit = (cut: Cut, path: Step[]): void => {
    if (cut.length <= 0 || cut.width <= 0) fault('a piece has no size.');
    if (cut.kind === 'part') {
      leaves.push(cut);
      const part = request.parts.find(({ id }) => id === cut.partId);
      if (!part) return fault(`there is no part “${cut.partId}”.`);
      const [length, width] = cut.turned ? [part.width, part.length] : [part.length, part.width];
      if (cut.length !== length || cut.width !== width) fault(`part ${part.id} has another size.`);
      const wish = part.grain ?? 'any';
      if (stock.grain !== false && wish !== 'any' && cut.turned !== (wish === 'across') && length !== width)
        fault(`part ${part.id} lies against its grain.`);
      if (!isInside(cut, usable)) fault(`part ${part.id} lies in the trim.`);
      const taken = stagesOf(path, firstCut);
      if (taken > stages) fault(`part ${part.id} takes ${taken} stages.`);
      return;
    }
    if (cut.kind !== 'cut') return;
    const along = cut.direction === 'along';
    const { first, rest } = cut;
    const expected: Rectangle = along
      ? { x: cut.x, y: cut.y, length: cut.length, width: cut.at - cut.y }
      : { x: cut.x, y: cut.y, length: cut.at - cut.x, width: cut.width };
    if (first ? !isSame(first, expected) : cut.at !== (along ? cut.y : cut.x))
      fault('a cut does not run from edge to edge.');
    const end = along ? cut.y + cut.width : cut.x + cut.length;
    const isEdge = !isInside(cut, usable);
    // Of a trim narrower than the blade only the trim itself is lost.
    const lost = isEdge ? Math.min(kerf, trim) : kerf;
    const behind = end - cut.at - lost;
    if (rest) {
      const expectedRest: Rectangle = along
        ? { x: cut.x, y: cut.at + lost, length: cut.length, width: behind }
        : { x: cut.x + (cut.at - cut.x) + lost, y: cut.y, length: behind, width: cut.width };
      if (!isSame(rest, expectedRest)) fault('a kerf is missing behind a cut.');
    } else if (behind > 0) fault('wood is missing behind a cut.');
    const trims = (child: Cut | null) => child === null || child.kind === 'waste' || child.kind === 'offcut';
    if (first) visit(first, [...path, { direction: cut.direction, isEdge, isTrim: trims(rest) }]);
    if (rest) visit(rest, [...path, { direction: cut.direction, isEdge, isTrim: trims(first) }]);
  };
  visit(sheet.cuts, []);

  const key = ({ x, y, length, width }: Rectangle, id: string) => [x, y, length, width, id].join();
  const cutParts = leaves.map((leaf) => key(leaf, leaf.partId)).sort();
  const placements = sheet.placements.map((placement) => key(placement, placement.partId)).sort();
  if (cutParts.join(';') !== placements.join(';')) fault('the placements are not what the cuts make.');
  for (const offcut of sheet.offcuts) if (!isInside(offcut, whole)) fault('an offcut lies outside the sheet.');
}

interface Step {
  direction: CutDirection;
  /** Takes the sheet's own trim off. */
  isEdge: boolean;
  /** What falls off is left over. */
  isTrim: boolean;
}

/**
 * Directions on the way to a part; neither the trim of the sheet's edges counts nor the last trims of the part. A sheet
 * that needs no first cut in the direction asked for has spent that stage all the same.
 */
function stagesOf(path: readonly Step[], firstCut: CutDirection | 'either'): number {
  const counted = path.filter(({ isEdge }) => !isEdge);
  const cuts = counted.slice(0, counted.findLastIndex(({ isTrim }) => !isTrim) + 1);
  const [first] = cuts;
  const skipped = first && firstCut !== 'either' && first.direction !== firstCut ? 1 : 0;
  return skipped + cuts.filter((step, i) => i === 0 || step.direction !== cuts[i - 1]!.direction).length;
}

function checkMatched(request: SheetRequest, plan: SheetPlan, faults: string[]): void {
  const groups = new Map<string, string[]>();
  for (const { id, matched, quantity } of request.parts)
    if (matched !== undefined)
      groups.set(matched, [...(groups.get(matched) ?? []), ...Array.from({ length: quantity }, () => id)]);
  for (const [group, ids] of groups) {
    const sheets = plan.sheets.filter(({ placements }) => placements.some(({ partId }) => ids.includes(partId)));
    if (sheets.length === 0) continue;
    if (sheets.length > 1) {
      faults.push(`Group ${group}: its pieces come from ${sheets.length} sheets.`);
      continue;
    }
    const pieces = sheets[0]!.placements.filter(({ partId }) => ids.includes(partId));
    const inOrder = (['x', 'y'] as const).some((side) => {
      const size = side === 'x' ? 'length' : 'width';
      const other = side === 'x' ? 'y' : 'x';
      const sorted = [...pieces].sort((a, b) => a[side] - b[side]);
      return (
        sorted.map(({ partId }) => partId).join() === ids.join() &&
        sorted.every(
          (piece, i) =>
            i === 0 ||
            (piece[side] === sorted[i - 1]![side] + sorted[i - 1]![size] + request.kerf &&
              piece[other] === sorted[0]![other] &&
              piece.turned === sorted[0]!.turned),
        )
      );
    });
    if (!inOrder) faults.push(`Group ${group}: its pieces do not lie side by side in order.`);
  }
}

function isSame(a: Rectangle, b: Rectangle): boolean {
  return a.x === b.x && a.y === b.y && a.length === b.length && a.width === b.width;
}

function isInside(a: Rectangle, b: Rectangle): boolean {
  return a.x >= b.x && a.y >= b.y && a.x + a.length <= b.x + b.length && a.y + a.width <= b.y + b.width;
}
