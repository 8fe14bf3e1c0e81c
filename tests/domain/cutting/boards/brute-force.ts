import type { BoardRequest, BoardStock } from '@/lib/domain/cutting';

/**
 * The least cost of a small list by trying everything: every way to group its pieces onto boards, every order along a
 * board. Written without a thought for speed and from the rules alone, to judge the planner by.
 *
 * @returns Infinity when no plan places every piece
 */
export function leastCost(request: BoardRequest): number {
  const lengths = request.parts.flatMap(({ length, reserve, quantity }) =>
    Array.from({ length: quantity }, () => reserve ?? length),
  );
  const isPriced = request.stock.some(({ price }) => price !== undefined);
  const known = new Map<string, number>();
  const fits = new Map<string, boolean>();
  const isCuttable = (stock: BoardStock, group: number): boolean => {
    const key = `${stock.id}/${group}`;
    const before = fits.get(key);
    if (before !== undefined) return before;
    const own = lengths.filter((_, i) => (group >> i) & 1);
    const answer = orders(own).some((order) => liesOn(request, stock, order));
    fits.set(key, answer);
    return answer;
  };
  const rest = (left: number, available: number[]): number => {
    if (left === 0) return 0;
    const key = `${left}/${available.join()}`;
    const before = known.get(key);
    if (before !== undefined) return before;
    const first = left & -left;
    let least = Infinity;
    for (let group = left; group > 0; group = (group - 1) & left) {
      if ((group & first) === 0) continue;
      request.stock.forEach((stock, s) => {
        if (available[s] === 0 || !isCuttable(stock, group)) return;
        const cost = isPriced ? (stock.price ?? 0) : stock.length;
        const fewer = available.map((count, other) => (other === s ? count - 1 : count));
        least = Math.min(least, cost + rest(left & ~group, fewer));
      });
    }
    known.set(key, least);
    return least;
  };
  return rest(
    (1 << lengths.length) - 1,
    request.stock.map(({ available }) => available ?? lengths.length),
  );
}

/** Whether pieces lie along a board in this order, each as early as kerf, trims and defects let it. */
function liesOn(request: BoardRequest, stock: BoardStock, order: number[]): boolean {
  const { kerf, trimStart = 0, trimEnd = 0 } = request;
  let free = trimStart;
  for (const length of order) {
    let start = free;
    for (let moved = true; moved;) {
      moved = false;
      for (const avoided of stock.avoid ?? [])
        if (start < avoided.end && start + length > avoided.start) {
          start = avoided.end;
          moved = true;
        }
    }
    if (start + length > stock.length - trimEnd) return false;
    free = start + length + kerf;
  }
  return true;
}

function orders(values: number[]): number[][] {
  if (values.length < 2) return [values];
  return values.flatMap((value, i) =>
    orders([...values.slice(0, i), ...values.slice(i + 1)]).map((others) => [value, ...others]),
  );
}
