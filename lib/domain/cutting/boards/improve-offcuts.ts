import { FillingTable } from './best-filling';
import type { PackingProblem } from './packing-problem';
import { widthOf, type Packing } from './pattern';

/** Room steps walked at most, so that the answer depends on the plan alone and not on the clock. */
const MAX_WORK = 20_000_000;
const GATHERED = 3;

/** One board of a plan with what lies in each of its slots; counts may be shared and are replaced, never changed. */
export interface FilledBoard {
  kind: number;
  contents: Int32Array[];
}

/** The boards of a packing, one by one. */
function boardsOf(problem: PackingProblem, packing: Packing): FilledBoard[] {
  const perSlot: Int32Array[][] = problem.slots.map(() => []);
  for (const { pattern, times } of packing.uses)
    for (let n = 0; n < times; n++) perSlot[pattern.slot]!.push(pattern.counts);
  return problem.kinds.flatMap(({ slots }, kind) =>
    Array.from({ length: packing.boards[kind]! }, (_, n) => ({
      kind,
      contents: slots.map((slot) => perSlot[slot]![n] ?? new Int32Array(problem.widths.length)),
    })),
  );
}

/**
 * Moves parts between the boards of a plan, at no more cost, so that what is left comes in few large pieces: the sum of
 * the squares of the pieces worth keeping grows with every move. A rack piece that is not touched counts as kept whole.
 */
function improveOffcuts(problem: PackingProblem, boards: FilledBoard[]): FilledBoard[] {
  const largest = problem.slots.reduce((most, { room }) => Math.max(most, room), 0);
  const table = new FillingTable(problem.widths, largest);
  let work = 0;
  for (let moved = true; moved;) {
    moved = false;
    for (let a = 0; a < boards.length; a++)
      for (let b = 0; b < boards.length; b++) {
        if (a === b || (boards[a]!.contents.length === 1 && hasSameContents(boards[a]!, boards[b]!))) continue;
        work += 8 * largest + 100 * problem.widths.length;
        if (work > MAX_WORK) return boards;
        if (fillFrom(problem, table, boards[a]!, boards[b]!)) moved = true;
      }
    if (changeKinds(problem, boards)) moved = true;
    const kept = boards.filter((board) => !isEmpty(board));
    if (kept.length < boards.length) boards = kept;
  }
  return boards;
}

/** Fills the first board as full as it goes with parts of both, if the second then keeps a better piece. */
function fillFrom(problem: PackingProblem, table: FillingTable, to: FilledBoard, from: FilledBoard): boolean {
  let moved = false;
  to.contents.forEach((into, s) => {
    from.contents.forEach((outOf, t) => {
      const both = into.map((count, i) => count + outOf[i]!);
      const { counts } = table.fill(problem.widths, both)(roomOf(problem, to, s));
      const rest = both.map((count, i) => count - counts[i]!);
      if (widthOf(problem, rest) > roomOf(problem, from, t)) return;
      const before = usefulness(problem, to) + usefulness(problem, from);
      to.contents[s] = counts;
      from.contents[t] = rest;
      if (usefulness(problem, to) + usefulness(problem, from) > before) {
        into = counts;
        outOf = rest;
        moved = true;
      } else {
        to.contents[s] = into;
        from.contents[t] = outOf;
      }
    });
  });
  return moved;
}

/** Puts boards in one piece onto another kind of the same cost where that keeps more. */
function changeKinds(problem: PackingProblem, boards: FilledBoard[]): boolean {
  const used = new Int32Array(problem.kinds.length);
  for (const { kind } of boards) used[kind]!++;
  let moved = false;
  for (const board of boards) {
    if (board.contents.length > 1 || isEmpty(board)) continue;
    problem.kinds.forEach(({ cost, limit, slots }, kind) => {
      if (kind === board.kind || slots.length > 1 || cost > problem.kinds[board.kind]!.cost || used[kind]! >= limit)
        return;
      if (widthOf(problem, board.contents[0]!) > problem.slots[slots[0]!]!.room) return;
      if (usefulness(problem, { ...board, kind }) <= usefulness(problem, board)) return;
      used[board.kind]!--;
      used[kind]!++;
      board.kind = kind;
      moved = true;
    });
  }
  return moved;
}

/**
 * Of several packings of one cost, the one whose leftovers, once gathered, are the most useful; its boards. Only the
 * most promising are gathered.
 */
export function mostUseful(problem: PackingProblem, packings: readonly Packing[]): FilledBoard[] {
  const useful = (boards: FilledBoard[]) => boards.reduce((sum, board) => sum + usefulness(problem, board), 0);
  const byUse = (a: Candidate, b: Candidate) => b.useful - a.useful;
  const gathered = packings
    .map((packing) => boardsOf(problem, packing))
    .map((boards) => ({ boards, useful: useful(boards) }))
    .sort(byUse)
    .slice(0, GATHERED)
    .map(({ boards }) => improveOffcuts(problem, boards))
    .map((boards) => ({ boards, useful: useful(boards) }));
  return gathered.sort(byUse)[0]!.boards;
}

interface Candidate {
  boards: FilledBoard[];
  useful: number;
}

function usefulness(problem: PackingProblem, board: FilledBoard): number {
  const { limited, slots } = problem.kinds[board.kind]!;
  const kept = slots.map((slot, s) => {
    const { start, end } = problem.slots[slot]!.stretch;
    const left = end - start - widthOf(problem, board.contents[s]!) * problem.step;
    return left >= problem.keepOffcut ? Math.max(0, left) ** 2 : 0;
  });
  const whole = slots.map((slot) => {
    const { start, end } = problem.slots[slot]!.stretch;
    return (end - start) ** 2;
  });
  const sum = (values: number[]) => values.reduce((a, b) => a + b, 0);
  return isEmpty(board) && limited ? 0 : sum(kept) - (limited ? sum(whole) : 0);
}

function roomOf(problem: PackingProblem, board: FilledBoard, s: number): number {
  return problem.slots[problem.kinds[board.kind]!.slots[s]!]!.room;
}

function isEmpty({ contents }: FilledBoard): boolean {
  return contents.every((counts) => counts.every((count) => count === 0));
}

function hasSameContents(a: FilledBoard, b: FilledBoard): boolean {
  return a.kind === b.kind && a.contents[0]!.every((count, i) => count === b.contents[0]![i]);
}
