import loadHighs from 'highs';
import type { BoardRequest } from '@/lib/domain/cutting';

/** Patterns that one model holds at most; past it the list counts as not solved. */
const MAX_PATTERNS = 150_000;

export interface ExactAnswer {
  cost: number;
  /** False when the solver stopped at its time limit: `cost` is then only the best it found. */
  isOptimal: boolean;
  /** No plan costs less. */
  bound: number;
}

type Highs = Awaited<ReturnType<typeof loadHighs>>;
let loading: Promise<Highs> | undefined;

/**
 * The exact optimum by another road, for checks: every full cutting pattern of every stock length as one whole-number
 * column of a covering model, handed to a general-purpose solver. Without defects, trims and limits on stock.
 *
 * @returns undefined when there are too many patterns, or nothing was found in the time
 */
export async function exactBoards(request: BoardRequest, timeLimitS: number): Promise<ExactAnswer | undefined> {
  const parts = [...request.parts].sort((a, b) => b.length - a.length);
  const isPriced = request.stock.some(({ price }) => price !== undefined);
  const columns: { cost: number; counts: number[] }[] = [];
  for (const { length, price } of request.stock) {
    const cost = isPriced ? (price ?? 0) : length;
    const isWithin = fullPatterns(request, length, parts, (counts) => {
      columns.push({ cost, counts: [...counts] });
      return columns.length <= MAX_PATTERNS;
    });
    if (!isWithin) return undefined;
  }
  const scale = Math.max(...columns.map(({ cost }) => cost));
  const rows = parts.map(({ quantity }, i) => {
    const terms = columns.flatMap(({ counts }, c) => (counts[i]! > 0 ? [`+ ${counts[i]} x${c}`] : []));
    return ` d${i}: ${wrap(terms)} >= ${quantity}`;
  });
  const model = [
    'Minimize',
    ` cost: ${wrap(columns.map(({ cost }, c) => `+ ${cost / scale} x${c}`))}`,
    'Subject To',
    ...rows,
    'General',
    wrap(columns.map((_, c) => `x${c}`)),
    'End',
  ].join('\n');
  const highs = await (loading ??= loadHighs());
  const solution = highs.solve(model, {
    time_limit: timeLimitS,
    mip_rel_gap: 1e-7,
    mip_abs_gap: 1e-7,
    output_flag: false,
  });
  if (solution.Status !== 'Optimal' && solution.Status !== 'Time limit reached') return undefined;
  const used = columns.map((_, c) => Math.round(solution.Columns[`x${c}`]?.Primal ?? 0));
  const isCovering = parts.every(
    ({ quantity }, i) => columns.reduce((sum, { counts }, c) => sum + counts[i]! * used[c]!, 0) >= quantity,
  );
  if (!isCovering) return undefined;
  const cost = columns.reduce((sum, column, c) => sum + column.cost * used[c]!, 0);
  return { cost, isOptimal: solution.Status === 'Optimal', bound: solution.Status === 'Optimal' ? cost : 0 };
}

/** Long lines are split, since the model format limits them. */
function wrap(terms: string[]): string {
  const lines: string[] = [];
  for (let at = 0; at < terms.length; at += 12) lines.push(terms.slice(at, at + 12).join(' '));
  return lines.join('\n  ');
}

/** Calls with each pattern to which nothing more that is wanted can be added. @returns false when stopped */
function fullPatterns(
  { kerf }: BoardRequest,
  length: number,
  parts: BoardRequest['parts'],
  take: (counts: readonly number[]) => boolean,
): boolean {
  const counts = parts.map(() => 0);
  const visit = (from: number, left: number): boolean => {
    if (from === parts.length) {
      const isFull = parts.every((part, i) => counts[i]! >= part.quantity || part.length + kerf > left);
      return !isFull || take(counts);
    }
    const { length: own, quantity } = parts[from]!;
    for (let count = Math.min(quantity, Math.floor(left / (own + kerf))); count >= 0; count--) {
      counts[from] = count;
      if (!visit(from + 1, left - count * (own + kerf))) return false;
    }
    counts[from] = 0;
    return true;
  };
  return visit(0, length + kerf);
}
