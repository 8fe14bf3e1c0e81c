import { projectBox, type Elevation, type Placement, type Point } from './project-box';

interface PlacementDrawingProps {
  placements: readonly Placement[];
  /** Parts of this step: blue. */
  highlighted: ReadonlySet<string>;
  /** Parts that are already in the piece; the others are drawn light. */
  standing: ReadonlySet<string>;
  elevation: Elevation;
  /** What the drawing shows, for those who do not see it. */
  label: string;
}

/**
 * Where parts sit in the finished piece: thin iron lines on paper, this step's parts in blue; where one is hidden behind
 * others its outline is dashed.
 */
export function PlacementDrawing({ placements, highlighted, standing, elevation, label }: PlacementDrawingProps) {
  const boxes = placements
    .map((placement) => ({ placement, ...projectBox(placement, elevation) }))
    .sort((a, b) => a.nearness - b.nearness);
  if (boxes.length === 0) return null;
  const xs = boxes.flatMap(({ outline }) => outline.map(({ x }) => x));
  const ys = boxes.flatMap(({ outline }) => outline.map(({ y }) => -y));
  const [left, top] = [Math.min(...xs), Math.min(...ys)];
  const [width, height] = [Math.max(...xs) - left, Math.max(...ys) - top];
  const pad = Math.max(width, height) * 0.03;
  const points = (outline: { x: number; y: number }[]) => outline.map(({ x, y }) => `${x},${-y}`).join(' ');
  return (
    <svg
      role="img"
      aria-label={label}
      viewBox={`${left - pad} ${top - pad} ${width + 2 * pad} ${height + 2 * pad}`}
      className="max-h-72 w-full"
      strokeLinejoin="round"
    >
      {boxes.map(({ placement, outline }) => {
        const now = highlighted.has(placement.part);
        return (
          <polygon
            key={`${placement.part}#${placement.piece}`}
            points={points(outline)}
            fill={now ? 'var(--blue)' : 'var(--paper)'}
            stroke={now ? 'var(--on-blue)' : standing.has(placement.part) ? 'var(--iron)' : 'var(--line)'}
            strokeWidth={1.5}
            vectorEffect="non-scaling-stroke"
          />
        );
      })}
      {boxes
        .filter((box, order) => highlighted.has(box.placement.part) && isHidden(box, boxes.slice(order + 1)))
        .map(({ placement, outline }) => (
          <polygon
            key={`${placement.part}#${placement.piece}`}
            points={points(outline)}
            fill="none"
            stroke="var(--blue)"
            strokeWidth={2}
            strokeDasharray="5 4"
            vectorEffect="non-scaling-stroke"
          />
        ))}
    </svg>
  );
}

interface Drawn {
  outline: readonly Point[];
}

/** Whether boxes nearer to the eye cover half or more of a box, judged by their frames: near enough for a dashed line. */
function isHidden(box: Drawn, nearer: readonly Drawn[]): boolean {
  const frame = frameOf(box);
  const area = (frame.right - frame.left) * (frame.top - frame.bottom);
  const covered = nearer.reduce((sum, other) => {
    const { left, right, bottom, top } = frameOf(other);
    const across = Math.min(right, frame.right) - Math.max(left, frame.left);
    const up = Math.min(top, frame.top) - Math.max(bottom, frame.bottom);
    return sum + (across > 0 && up > 0 ? across * up : 0);
  }, 0);
  return covered >= area / 2;
}

function frameOf({ outline }: Drawn) {
  const xs = outline.map(({ x }) => x);
  const ys = outline.map(({ y }) => y);
  return { left: Math.min(...xs), right: Math.max(...xs), bottom: Math.min(...ys), top: Math.max(...ys) };
}
