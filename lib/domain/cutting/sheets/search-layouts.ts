import { seededRandom } from '../seeded-random';
import type { TimeIsUp } from '../run-control';
import { bestPlace, layAt, type Weights } from './insert';
import { copySheet, emptySheet, takeOff, type SheetLayout } from './layout';
import { cheaperSheets } from './cheaper-sheets';
import { fitsKind, type Item, type SheetKind, type SheetProblem } from './sheet-problem';

export interface Layouts {
  sheets: SheetLayout[];
  /** Items for which no sheet is left. */
  missing: Item[];
  cost: number;
}

/** Long lists are laid once, looking back over this many sheets. */
const LOOK_BACK = 12;
/** Accepted is what is no worse than this many rounds ago. */
const MEMORY = 300;
/** Rounds without a better layout until the search begins anew from the best. */
const STALE = 12_000;
/** Rounds spent on larger offcuts once the cost is settled. */
const OFFCUT_ROUNDS = 400;

const plainWeights: Weights = { above: 0.7, beside: 0.3, passOver: 0, rest: 0 };

type Order = (a: Item, b: Item) => number;
const longest = ({ lies }: Item) => Math.max(lies[0]!.x, lies[0]!.y);
const orders: readonly Order[] = [
  (a, b) => b.area - a.area,
  (a, b) => longest(b) - longest(a) || b.area - a.area,
  (a, b) => b.lies[0]!.y - a.lies[0]!.y || b.lies[0]!.x - a.lies[0]!.x,
  (a, b) => b.lies[0]!.x - a.lies[0]!.x || b.lies[0]!.y - a.lies[0]!.y,
];

/**
 * Layouts of least cost, as far as found until the time is up or the cost reaches `bound`.
 *
 * First each item goes where it spoils least, in several orders. Then sheets that cost less are set as the goal, and
 * pieces are taken off and laid anew until all lie on them (goal-driven ruin and recreate with late acceptance, after
 * Gardeyn and Wauters, European Journal of Operational Research 301, 2022, on strips instead of free cuts).
 *
 * @param seed  start of the random part; the same seed gives the same layouts when the run ends by proof
 */
export function searchLayouts(
  problem: SheetProblem,
  seed: number,
  bound: number,
  isTimeUp: TimeIsUp,
  onBetter: (better: Layouts) => void,
): Layouts {
  const random = seededRandom(seed);
  let best = firstLayouts(problem, random, isTimeUp);
  onBetter(best);
  if (best.missing.length > 0 || problem.items.length === 0) return best;
  for (;;) {
    const better = best.cost > bound ? reachGoal(problem, best, random, isTimeUp) : null;
    if (!better) break;
    best = better;
    onBetter(best);
  }
  return best;
}

/** The best of several orders and first directions, each item laid once. */
function firstLayouts(problem: SheetProblem, random: () => number, isTimeUp: TimeIsUp): Layouts {
  let best: Layouts | null = null;
  const directions = [...new Set(problem.kinds.map(({ direction }) => direction))];
  const choices = problem.items.length > 1_000 ? orders.slice(0, 1) : orders;
  for (const direction of directions) {
    for (const order of choices) {
      if (best && isTimeUp()) return best;
      const preferred = problem.kinds.filter((kind) => kind.direction === direction);
      const made = layAll(problem, [...problem.items].sort(order), preferred, random);
      if (!best || isBetter(made, best)) best = made;
    }
  }
  return best ?? { sheets: [], missing: [...problem.items], cost: 0 };
}

function isBetter(a: Layouts, b: Layouts): boolean {
  const missing = (layouts: Layouts) => layouts.missing.reduce((sum, { area }) => sum + area, 0);
  return missing(a) - missing(b) < 0 || (missing(a) === missing(b) && a.cost < b.cost);
}

function layAll(
  problem: SheetProblem,
  items: readonly Item[],
  preferred: readonly SheetKind[],
  random: () => number,
): Layouts {
  const sheets: SheetLayout[] = [];
  const missing: Item[] = [];
  const used = problem.available.map(() => 0);
  const many = items.length > 1_000;
  for (const item of items) {
    const from = many ? Math.max(0, sheets.length - LOOK_BACK) : 0;
    let place = bestPlace(item, sheets, from, problem, plainWeights, random);
    if (!place) {
      const kind = cheapestFor(item, preferred, problem, used) ?? cheapestFor(item, problem.kinds, problem, used);
      if (kind) {
        used[kind.stock]! += 1;
        sheets.push(emptySheet(kind));
        place = bestPlace(item, sheets, sheets.length - 1, problem, plainWeights, random);
      }
    }
    if (place) layAt(sheets[place.sheet]!, place);
    else missing.push(item);
  }
  return { sheets, missing, cost: costOf(sheets) };
}

function cheapestFor(
  item: Item,
  kinds: readonly SheetKind[],
  problem: SheetProblem,
  used: readonly number[],
): SheetKind | null {
  let best: SheetKind | null = null;
  for (const kind of kinds) {
    if (used[kind.stock]! >= problem.available[kind.stock]!) continue;
    if (item.row !== null && (item.row === 'x') !== (kind.direction === 'along')) continue;
    if (!item.lies.some((lie) => fitsKind(lie, kind))) continue;
    if (!best || kind.cost * best.u * best.v < best.cost * kind.u * kind.v) best = kind;
  }
  return best;
}

/** Layouts on sheets that cost less than these, or null when none was found in time. */
function reachGoal(problem: SheetProblem, from: Layouts, random: () => number, isTimeUp: TimeIsUp): Layouts | null {
  while (!isTimeUp()) {
    const goal = cheaperSheets(problem, from.sheets, random);
    if (!goal) return null;
    const reached = fill(problem, goal.sheets.map(copySheet), goal.off, random, isTimeUp);
    if (reached) return { sheets: reached, missing: [], cost: costOf(reached) };
  }
  return null;
}

function fill(
  problem: SheetProblem,
  start: SheetLayout[],
  off: readonly Item[],
  random: () => number,
  isTimeUp: TimeIsUp,
): SheetLayout[] | null {
  let current = { sheets: start, off: [...off] };
  let energy = energyOf(current);
  const memory = new Float64Array(MEMORY).fill(energy);
  let least = energy;
  for (let round = 0, stale = 0; stale < STALE; round += 1, stale += 1) {
    if (round % 8 === 0 && isTimeUp()) return null;
    const next = ruinAndRecreate(problem, current, random);
    if (next.off.length === 0) return next.sheets.filter(({ strips }) => strips.length > 0);
    const made = energyOf(next);
    if (made <= energy || made <= memory[round % MEMORY]!) {
      current = next;
      energy = made;
      if (made < least - 1e-9) {
        least = made;
        stale = 0;
      }
    }
    memory[round % MEMORY] = energy;
  }
  return null;
}

interface Packed {
  sheets: SheetLayout[];
  off: Item[];
}

/** Area not laid; less where some sheets are full and others have room, since room in one place is worth more. */
function energyOf({ sheets, off }: Packed): number {
  let energy = 0;
  for (const { area } of off) energy += area;
  for (const { kind, filled } of sheets) energy -= (0.1 * filled * filled) / (kind.u * kind.v);
  return energy;
}

function ruinAndRecreate(problem: SheetProblem, { sheets, off }: Packed, random: () => number): Packed {
  const next = sheets.slice();
  const loose = off.slice();
  const ruin = (index: number) => {
    const sheet = copySheet(next[index]!);
    next[index] = sheet;
    loose.push(...ruinSheet(sheet, random));
  };
  const first = Math.floor(random() * next.length);
  ruin(first);
  if (next.length > 1 && random() < 0.6) {
    const second = Math.floor(random() * next.length);
    if (second !== first) ruin(second);
  }
  const order = orders[Math.floor(random() * orders.length)]!;
  // Now and then one goes a few places earlier or later than the order says.
  const blur = random() < 0.5 ? 0 : 0.3;
  if (blur === 0) loose.sort(order);
  else {
    const keys = new Map(loose.map((item) => [item, item.area * (1 + blur * (random() - 0.5))]));
    loose.sort((a, b) => keys.get(b)! - keys.get(a)!);
  }
  const weights: Weights = {
    above: 0.3 + 0.7 * random(),
    beside: 0.1 + 0.5 * random(),
    passOver: 0.02,
    rest: 0,
  };
  const copied = new Set<number>();
  const left: Item[] = [];
  for (const item of loose) {
    const place = bestPlace(item, next, 0, problem, weights, random);
    if (!place) {
      left.push(item);
      continue;
    }
    const old = next[place.sheet]!;
    if (!copied.has(place.sheet) && old === sheets[place.sheet]) {
      // The place names parts of the old sheet, so it is looked up again on the copy.
      copied.add(place.sheet);
      const copy = copySheet(old);
      next[place.sheet] = copy;
      const strip = place.strip && copy.strips[old.strips.indexOf(place.strip)]!;
      const stack = place.stack && strip && strip.stacks[place.strip!.stacks.indexOf(place.stack)]!;
      layAt(copy, { ...place, strip, stack });
    } else layAt(old, place);
  }
  return { sheets: next, off: left };
}

/** Takes a strip, a stack, some pieces or everything off a sheet. */
function ruinSheet(sheet: SheetLayout, random: () => number): Item[] {
  if (sheet.strips.length === 0) return [];
  const choice = random();
  const strip = Math.floor(random() * sheet.strips.length);
  if (choice < 0.15) return takeOff(sheet, (_, s) => s === strip);
  if (choice < 0.65) {
    const stack = Math.floor(random() * sheet.strips[strip]!.stacks.length);
    return takeOff(sheet, (_, s, t) => s === strip && t === stack);
  }
  if (choice < 0.7) return takeOff(sheet, () => true);
  const share = 0.1 + 0.4 * random();
  return takeOff(sheet, () => random() < share);
}

const costOf = (sheets: readonly SheetLayout[]) => sheets.reduce((sum, { kind }) => sum + kind.cost, 0);

/** The same sheets with more of what is left over in one piece; a fixed number of rounds, so that it is repeatable. */
export function gatherOffcuts(
  problem: SheetProblem,
  sheets: SheetLayout[],
  seed: number,
  isTimeUp: TimeIsUp,
): SheetLayout[] {
  const random = seededRandom(seed ^ 0x5bd1e995);
  let best = { sheets, off: [] as Item[] };
  let largest = largestRest(best.sheets);
  for (let round = 0; sheets.length > 0 && round < OFFCUT_ROUNDS && !isTimeUp(); round += 1) {
    const next = ruinAndRecreate(problem, best, random);
    if (next.off.length > 0) continue;
    const rest = largestRest(next.sheets);
    if (rest >= largest) {
      best = next;
      largest = rest;
    }
  }
  return best.sheets.filter(({ strips }) => strips.length > 0);
}

/** Area of the largest rectangle that is left over: over the strips, or at the end of one. */
function largestRest(sheets: readonly SheetLayout[]): number {
  let most = 0;
  for (const { kind, strips, v } of sheets) {
    most = Math.max(most, kind.u * (kind.v - v));
    for (const strip of strips) most = Math.max(most, (kind.u - strip.u) * strip.v);
  }
  return most;
}
