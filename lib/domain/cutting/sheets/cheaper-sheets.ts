import { emptySheet, itemsOf, type SheetLayout } from './layout';
import type { Item, SheetKind, SheetProblem } from './sheet-problem';

interface Goal {
  sheets: SheetLayout[];
  /** Items that lay on the sheets that went. */
  off: Item[];
}

interface Change {
  /** Sheets that go, by index. */
  go: number[];
  /** Sheet that comes in their place. */
  come: SheetKind | null;
  /** Area that is lost. */
  loss: number;
}

/**
 * Sheets that together cost less: one goes, or is changed for a cheaper one, or two for one. Only changes that leave
 * area enough; among them at random, the ones that lose least likelier.
 */
export function cheaperSheets(
  problem: SheetProblem,
  sheets: readonly SheetLayout[],
  random: () => number,
): Goal | null {
  const areaOf = ({ u, v }: SheetKind) => u * v;
  const spare =
    sheets.reduce((sum, { kind }) => sum + areaOf(kind), 0) - problem.items.reduce((sum, { area }) => sum + area, 0);
  const used = problem.available.map((_, stock) => sheets.filter(({ kind }) => kind.stock === stock).length);
  const changes: Change[] = [];
  const consider = (go: number[]) => {
    const cost = go.reduce((sum, index) => sum + sheets[index]!.kind.cost, 0);
    const area = go.reduce((sum, index) => sum + areaOf(sheets[index]!.kind), 0);
    if (cost > 0 && area <= spare) changes.push({ go, come: null, loss: area });
    for (const come of problem.kinds) {
      const left = go.filter((index) => sheets[index]!.kind.stock === come.stock).length;
      if (used[come.stock]! - left >= problem.available[come.stock]!) continue;
      if (come.cost < cost && area - areaOf(come) <= spare) changes.push({ go, come, loss: area - areaOf(come) });
    }
  };
  sheets.forEach((_, index) => consider([index]));
  if (new Set(problem.kinds.map(({ stock }) => stock)).size > 1 && sheets.length <= 40)
    for (let i = 0; i < sheets.length; i += 1) for (let j = 0; j < i; j += 1) consider([j, i]);
  if (changes.length === 0) return null;
  const filledOf = ({ go }: Change) => go.reduce((sum, index) => sum + sheets[index]!.filled, 0);
  changes.sort((a, b) => a.loss - b.loss || filledOf(a) - filledOf(b));
  const { go, come } = changes[Math.floor(random() ** 3 * changes.length)]!;
  const kept = sheets.filter((_, index) => !go.includes(index));
  return {
    sheets: come ? [...kept, emptySheet(come)] : kept,
    off: go.flatMap((index) => itemsOf(sheets[index]!)),
  };
}
