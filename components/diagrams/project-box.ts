import type { PlanDocument } from '@/lib/domain/plan/document';

export type Placement = PlanDocument['placements'][number];
/** Side that the piece is looked at from. */
export type Elevation = 'front' | 'side' | 'top';

export interface Point {
  x: number;
  y: number;
}

/** Axes seen across, up and towards the eye, for each view; signs turn the piece so that left stays left. */
const VIEWS: Record<
  Elevation,
  { across: 0 | 1 | 2; up: 0 | 1 | 2; depth: 0 | 1 | 2; acrossSign: 1 | -1; upSign: 1 | -1 }
> = {
  front: { across: 0, up: 1, depth: 2, acrossSign: 1, upSign: 1 },
  // From the right: the front of the piece is at the left.
  side: { across: 2, up: 1, depth: 0, acrossSign: -1, upSign: 1 },
  // From above: the front of the piece is at the bottom.
  top: { across: 0, up: 2, depth: 1, acrossSign: 1, upSign: -1 },
};

/** Outline of a placed part in a view, as a convex polygon with y up, and how near its middle is to the eye. 1/640 mm. */
export function projectBox(placement: Placement, elevation: Elevation): { outline: Point[]; nearness: number } {
  const { across, up, depth, acrossSign, upSign } = VIEWS[elevation];
  const centre = [placement.x, placement.y, placement.z].map((at, axis) => at + placement.size[axis]! / 2);
  const points = corners(placement).map((corner) => ({
    x: acrossSign * corner[across]!,
    y: upSign * corner[up]!,
  }));
  return { outline: convexHull(points), nearness: centre[depth]! + placement.size[depth]! / 2 };
}

function corners({ x, y, z, size, turnDeg }: Placement): number[][] {
  const centre = [x + size[0] / 2, y + size[1] / 2, z + size[2] / 2];
  const angle = ((turnDeg?.angle ?? 0) * Math.PI) / 180;
  const axis = turnDeg ? 'xyz'.indexOf(turnDeg.axis) : -1;
  const [a, b] = axis === 0 ? [1, 2] : axis === 1 ? [2, 0] : [0, 1];
  return [0, 1, 2, 3, 4, 5, 6, 7].map((bits) => {
    const offset = [0, 1, 2].map((i) => ((bits >> i) & 1 ? 0.5 : -0.5) * size[i]!);
    if (axis >= 0) {
      const [oa, ob] = [offset[a]!, offset[b]!];
      offset[a] = oa * Math.cos(angle) - ob * Math.sin(angle);
      offset[b] = oa * Math.sin(angle) + ob * Math.cos(angle);
    }
    return offset.map((value, i) => centre[i]! + value);
  });
}

/** Convex hull by Andrew's monotone chain, anticlockwise. */
export function convexHull(points: readonly Point[]): Point[] {
  const sorted = [...points].sort((p, q) => p.x - q.x || p.y - q.y);
  const half = (ordered: readonly Point[]) => {
    const chain: Point[] = [];
    for (const point of ordered) {
      while (chain.length >= 2 && turn(chain.at(-2)!, chain.at(-1)!, point) <= 0) chain.pop();
      chain.push(point);
    }
    return chain.slice(0, -1);
  };
  return [...half(sorted), ...half([...sorted].reverse())];
}

function turn(o: Point, a: Point, b: Point): number {
  return (a.x - o.x) * (b.y - o.y) - (a.y - o.y) * (b.x - o.x);
}
