import type { PackingProblem } from './packing-problem';

/** Partial mixes looked at at most while listing. */
const MAX_STEPS = 300_000;

/** How many boards of each kind, before anything is put on them. */
export interface BoardMix {
  boards: Int32Array;
  /** In cost units. */
  cost: number;
  /** Room less all that must go in, in steps: what may be wasted. */
  spare: number;
}

/**
 * The mixes of boards that cost at least `from` and less than `below` and have room for everything, cheapest first,
 * then most room first. A cheaper plan than the best uses one of them.
 *
 * @returns undefined when there are more than `most`
 */
export function boardMixes(problem: PackingProblem, from: number, below: number, most: number): BoardMix[] | undefined {
  const { kinds, slots, widths, demands, pieces } = problem;
  const needed = widths.reduce((sum, width, i) => sum + width * demands[i]!, 0);
  const rooms = kinds.map((kind) => kind.slots.reduce((sum, slot) => sum + slots[slot]!.boundRoom, 0));
  const order = Array.from(kinds.keys()).sort((a, b) => kinds[b]!.cost - kinds[a]!.cost || a - b);
  // From each place in the order on: the most room a unit of cost can buy, and what comes free.
  const rates = new Float64Array(order.length + 1);
  const free = new Float64Array(order.length + 1);
  for (let at = order.length - 1; at >= 0; at--) {
    const { cost, limit } = kinds[order[at]!]!;
    rates[at] = cost > 0 ? Math.max(rates[at + 1]!, rooms[order[at]!]! / cost) : rates[at + 1]!;
    free[at] = free[at + 1]! + (cost > 0 ? 0 : limit * rooms[order[at]!]!);
  }
  const boards = new Int32Array(kinds.length);
  const mixes: BoardMix[] = [];
  let steps = 0;
  /** False when the limits were passed. */
  const visit = (at: number, cost: number, room: number): boolean => {
    if (++steps > MAX_STEPS) return false;
    if (room + free[at]! + rates[at]! * (below - 1 - cost) < needed - 1e-6) return true;
    if (at === order.length) {
      if (cost < from) return true;
      mixes.push({ boards: boards.slice(), cost, spare: room - needed });
      return mixes.length <= most;
    }
    const kind = order[at]!;
    const { cost: each, limit } = kinds[kind]!;
    const times = each > 0 ? Math.min(limit, Math.floor((below - 1 - cost) / each)) : Math.min(limit, pieces);
    // Boards that cost nothing are all at hand: a mix with fewer of them is no cheaper.
    for (let count = times; count >= (each > 0 ? 0 : times); count--) {
      boards[kind] = count;
      if (!visit(at + 1, cost + count * each, room + count * rooms[kind]!)) return false;
    }
    boards[kind] = 0;
    return true;
  };
  if (!visit(0, 0, 0)) return undefined;
  return mixes.sort((a, b) => a.cost - b.cost || b.spare - a.spare);
}

/** True when every plan on `mix` is also one on `other`. */
export function isWithin(mix: BoardMix, other: BoardMix): boolean {
  return mix.boards.every((count, kind) => count <= other.boards[kind]!);
}
