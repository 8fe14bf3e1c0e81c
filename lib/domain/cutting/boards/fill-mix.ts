import type { BoardMix } from './board-mixes';
import { fullPatterns } from './full-patterns';
import type { PackingProblem } from './packing-problem';
import { takeFrom, widthOf, type Pattern, type PatternUse } from './pattern';
import type { TimeIsUp } from '../run-control';

/** Fillings looked at for one slot at most; past it the search is no longer complete. */
const MAX_FILLINGS = 400;
const MAX_REMEMBERED = 60_000;

/** What a search for a way to put everything on a given mix came to. */
export type MixAnswer = { found: PatternUse[] } | 'impossible' | 'unknown';

/**
 * Bin completion: the longest part left goes onto a board of each kind in turn, with each full way to use the rest of
 * that board that wastes no more than the mix can spare, fullest first. What failed once is remembered.
 *
 * @param mostNodes  boards begun at most
 */
export function fillMix(problem: PackingProblem, mix: BoardMix, mostNodes: number, isTimeUp: TimeIsUp): MixAnswer {
  const { slots, widths, demands } = problem;
  const left = Int32Array.from(demands);
  const boards = Int32Array.from(slots, ({ kind }) => mix.boards[kind]!);
  const failed = new Set<string>();
  const uses: PatternUse[] = [];
  let isComplete = slots.every(({ room, boundRoom }) => room === boundRoom);
  let isStopped = false;
  let nodes = 0;
  const visit = (spare: number): boolean => {
    const longest = left.findIndex((count) => count > 0);
    if (longest < 0) return true;
    const key = `${left.join()}|${boards.join()}`;
    if (failed.has(key)) return false;
    if (++nodes > mostNodes || isTimeUp()) isStopped = true;
    if (isStopped) return false;
    const choices: { pattern: Pattern; waste: number }[] = [];
    slots.forEach(({ boundRoom, room }, slot) => {
      if (boards[slot] === 0 || room < widths[longest]!) return;
      const { found, isAll } = fullPatterns(widths, left, room, longest, boundRoom - spare, MAX_FILLINGS);
      if (!isAll) isComplete = false;
      for (const counts of found)
        choices.push({ pattern: { slot, counts }, waste: boundRoom - widthOf(problem, counts) });
    });
    choices.sort((a, b) => a.waste - b.waste || a.pattern.slot - b.pattern.slot);
    for (const { pattern, waste } of choices) {
      takeFrom(left, pattern.counts, 1);
      boards[pattern.slot]!--;
      uses.push({ pattern, times: 1 });
      if (visit(spare - waste)) return true;
      uses.pop();
      boards[pattern.slot]!++;
      takeFrom(left, pattern.counts, -1);
      if (isStopped) return false;
    }
    if (failed.size < MAX_REMEMBERED) failed.add(key);
    return false;
  };
  if (visit(mix.spare)) return { found: uses };
  return isComplete && !isStopped ? 'impossible' : 'unknown';
}
