import type { PlanDocumentInput } from '@/lib/domain/plan/document';
import { formatLength, type LengthStyle } from '@/lib/domain/measure';

type Box = PlanDocumentInput['placements'][number];
type View = { title: string; across: (box: Box) => [number, number]; depth: (box: Box) => number };

const WIDTH = 1_200;
const MOST_HIGH = 560;
const views: View[] = [
  { title: 'Front', across: ({ x, size }) => [x, size[0]], depth: ({ z, size }) => z + size[2] },
  { title: 'Right side', across: ({ z, size }) => [-(z + size[2]), size[2]], depth: ({ x, size }) => x + size[0] },
];

/** Front and side elevation from the placements of a plan, as SVG: thin iron lines on chalk, sizes outside the piece. */
export function drawElevations(plan: PlanDocumentInput): string {
  // Where a plan makes several of one thing, the first is drawn.
  const boxes = plan.id === 'folding-trestles' ? plan.placements.slice(0, 8) : plan.placements;
  const style: LengthStyle =
    plan.units === 'imperial' ? { system: 'imperial', denominator: 16 } : { system: 'metric', unit: 'mm', decimals: 0 };
  const top = Math.max(...boxes.map(({ y, size }) => y + size[1]));
  const spans = views.map(({ across }) => {
    const ends = boxes.flatMap((box) => [across(box)[0], across(box)[0] + across(box)[1]]);
    return { from: Math.min(...ends), to: Math.max(...ends) };
  });
  const gap = 220;
  const scale = Math.min(
    (WIDTH - 180 - gap) / spans.reduce((sum, { from, to }) => sum + to - from, 0),
    MOST_HIGH / top,
  );
  const height = Math.ceil(top * scale) + 190;
  let left = 60;
  const drawn = views.map((view, i) => {
    const { from, to } = spans[i]!;
    const x = (value: number) => left + (value - from) * scale;
    const y = (value: number) => height - 110 - value * scale;
    // What is nearer covers what is behind it.
    const rects = [...boxes]
      .sort((a, b) => view.depth(a) - view.depth(b))
      .map((box) => {
        const [start, length] = view.across(box);
        const turn =
          view.title !== 'Front' && box.turnDeg
            ? ` transform="rotate(${box.turnDeg.angle} ${x(start + length / 2)} ${y(box.y + box.size[1] / 2)})"`
            : '';
        return `<rect x="${x(start).toFixed(1)}" y="${y(box.y + box.size[1]).toFixed(1)}" width="${(length * scale).toFixed(1)}" height="${(box.size[1] * scale).toFixed(1)}" fill="#fffdf7"${turn}/>`;
      });
    const label = (text: string, cx: number, cy: number, turn = '') =>
      `<text x="${cx}" y="${cy}" text-anchor="middle"${turn}>${text}</text>`;
    const base = height - 70;
    const across = `<path d="M${x(from)} ${base}H${x(to)}M${x(from)} ${base - 8}v16M${x(to)} ${base - 8}v16"/>`;
    const side = x(to) + 40;
    const up = `<path d="M${side} ${y(0)}V${y(top)}M${side - 8} ${y(0)}h16M${side - 8} ${y(top)}h16"/>`;
    const middle = (x(from) + x(to)) / 2;
    const texts = [
      label(view.title, middle, 44),
      label(formatLength(to - from, style).text, middle, base + 34),
      label(
        formatLength(top, style).text,
        side + 34,
        y(top / 2),
        ` transform="rotate(-90 ${side + 34} ${y(top / 2)})"`,
      ),
    ];
    left = x(to) + gap - 60;
    return `<g fill="none" stroke="#191c1e" stroke-width="1.5">${rects.join('')}${across}${up}</g><g fill="#191c1e" font-family="DejaVu Sans, sans-serif" font-size="24">${texts.join('')}</g>`;
  });
  return `<svg xmlns="http://www.w3.org/2000/svg" width="${WIDTH}" height="${height}"><rect width="100%" height="100%" fill="#f7f4ec"/>${drawn.join('')}</svg>`;
}
