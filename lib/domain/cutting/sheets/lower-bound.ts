import { fitsKind, type Item, type SheetKind, type SheetProblem } from './sheet-problem';

/** A function of sizes up to `full` into [0, 1] that never lets pieces that fit beside one another sum to over 1. */
type DualFeasible = (size: number) => number;

/**
 * No plan costs less than this, whatever the rule of cutting.
 *
 * Each piece is given a worth so that what fits on one sheet is never worth more than the sheet costs: its area, and the
 * products of dual feasible functions of its two sides (Fekete and Schepers, Mathematical Methods of Operations Research
 * 60, 2004). A piece that may be turned, or go on several sheets, has the least of its worths. The sum is rounded up to
 * a cost that sheets can have, prices being whole.
 */
export function sheetLowerBound(problem: SheetProblem): number {
  const { items } = problem;
  // Kinds of one sheet differ in the direction of the first cut alone, which the bound does not know.
  const kinds = problem.kinds.filter(
    (kind, index) => problem.kinds.findIndex(({ stock }) => stock === kind.stock) === index,
  );
  if (items.length === 0 || kinds.length === 0) return 0;
  const sizes = kinds.map(
    (kind) => (kind.direction === 'along' ? [kind.u, kind.v] : [kind.v, kind.u]) as [number, number],
  );
  const step = kinds.reduce((divisor, { cost }) => greatestDivisor(divisor, cost), 0);
  if (step === 0) return 0;
  const families = sizes.map(([x, y]) => [familyFor(x, items, 'x'), familyFor(y, items, 'y')] as const);
  // Pieces of one part share their lies, and so their worth.
  const groups = new Map<Item['lies'], { item: Item; count: number }>();
  for (const item of items) {
    const group = groups.get(item.lies);
    if (group) group.count += 1;
    else groups.set(item.lies, { item, count: 1 });
  }
  const rows = [...groups.values()].map(({ item, count }) => ({ count, lies: worthsOf(item, kinds, families) }));
  let bound = 0;
  for (let f = 0; f < PARAMETERS; f += 1) {
    for (let g = 0; g < PARAMETERS; g += 1) {
      let worth = 0;
      for (const { count, lies } of rows) {
        let least = Infinity;
        for (const { cost, ofX, ofY } of lies) least = Math.min(least, cost * ofX[f]! * ofY[g]!);
        worth += count * least;
      }
      // A hair less, so that rounding of the sum never lifts the bound over a whole step.
      bound = Math.max(bound, Math.ceil(worth / step - 1e-9) * step);
    }
  }
  return bound;
}

/** Functions for each side; all sides have the same number, so that one index means one choice for every sheet. */
const PARAMETERS = 24;

/** Worth of an item under each function, for every sheet and way in which it can lie. */
function worthsOf(
  item: Item,
  kinds: readonly SheetKind[],
  families: readonly (readonly [DualFeasible[], DualFeasible[]])[],
): { cost: number; ofX: number[]; ofY: number[] }[] {
  return kinds.flatMap((kind, index) => {
    const [ofX, ofY] = families[index]!;
    const lies = item.lies.filter((lie) => fitsKind(lie, kind));
    return lies.map(({ x, y }) => ({ cost: kind.cost, ofX: ofX.map((of) => of(x)), ofY: ofY.map((of) => of(y)) }));
  });
}

/** Thresholds at shares of the side at which these pieces' own sizes lie. */
function familyFor(full: number, items: readonly Item[], side: 'x' | 'y'): DualFeasible[] {
  const sides = new Set(items.flatMap(({ lies }) => lies.map((lie) => lie[side])));
  const small = [...sides].filter((size) => 2 * size <= full).sort((a, b) => a - b);
  const pick = (count: number) =>
    Array.from({ length: count }, (_, i) => small[Math.floor((i * small.length) / count)] ?? Math.floor(full / 2));
  const whole: DualFeasible = (size) => size / full;
  return [
    whole,
    ...[1, 2, 3, 4, 5].map((k) => stepped(full, k)),
    ...pick(10).map((threshold) => large(full, threshold)),
    ...pick(8).map((threshold) => halved(full, threshold)),
  ];
}

/** Over `full` less the threshold counts whole, under the threshold nothing. */
function large(full: number, threshold: number): DualFeasible {
  return (size) => (size > full - threshold ? 1 : size < threshold ? 0 : size / full);
}

/** Rounded down to multiples of 1/k, but for sizes that divide evenly. */
function stepped(full: number, k: number): DualFeasible {
  return (size) => (((k + 1) * size) % full === 0 ? size / full : Math.floor(((k + 1) * size) / full) / k);
}

/** Halves and thirds of the threshold: what is over a half takes the room that its rest leaves. */
function halved(full: number, threshold: number): DualFeasible {
  const most = Math.floor(full / threshold);
  return (size) => {
    if (2 * size > full) return 1 - Math.floor((full - size) / threshold) / most;
    return size >= threshold ? 1 / most : 0;
  };
}

function greatestDivisor(a: number, b: number): number {
  while (b !== 0) [a, b] = [b, a % b];
  return a;
}
