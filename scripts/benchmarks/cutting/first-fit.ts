import type { BoardRequest } from '@/lib/domain/cutting';

/**
 * First-fit decreasing, for comparison: longest part first, each onto the first open board with room for it, else onto a
 * new one. With several lengths of stock it is tried with each as the one that is opened (the next longer one where a part
 * does not fit) and the cheapest is kept.
 */
export function firstFitCost(request: BoardRequest): number {
  const isPriced = request.stock.some(({ price }) => price !== undefined);
  const kinds = request.stock
    .map(({ length, price }) => ({ room: length + request.kerf, cost: isPriced ? (price ?? 0) : length }))
    .sort((a, b) => a.room - b.room);
  const widths = request.parts
    .flatMap(({ length, quantity }) => Array.from({ length: quantity }, () => length + request.kerf))
    .sort((a, b) => b - a);
  return Math.min(
    ...kinds.map((_, preferred) => {
      const open: number[] = [];
      let cost = 0;
      for (const width of widths) {
        const at = open.findIndex((room) => room >= width);
        if (at >= 0) {
          open[at]! -= width;
          continue;
        }
        const kind = kinds.slice(preferred).find(({ room }) => room >= width) ?? kinds.at(-1)!;
        open.push(kind.room - width);
        cost += kind.cost;
      }
      return cost;
    }),
  );
}
