import type { PlanPart, PlanStep } from '@/lib/domain/plan/document';

interface PartGlyphProps {
  part: Pick<PlanPart, 'hand' | 'grain' | 'referenceFace'>;
  operation: PlanStep['operation'];
  /** `sheet` stock is drawn as a panel, lumber as a strip. */
  stock: 'lumber' | 'sheet';
}

/** What is done to the end, edge or face of a strip, in a box of 64 × 28. Hatching is what comes off. */
function Work({ operation }: { operation: PlanStep['operation'] }) {
  switch (operation) {
    case 'half-lap':
      return <path d="M2 2h22v13H2zM2 9l7-7M2 15 15 2M9 15 22 2M16 15l8-8" />;
    case 'rabbet':
      return <path d="M2 2h60v7H2zM6 9l7-7M18 9l7-7M30 9l7-7M42 9l7-7M54 9l7-7" />;
    case 'dado':
      return <path d="M26 2h12v13H26zM26 9l7-7M26 15 38 3M32 15l6-6" />;
    case 'mortise':
      return <path d="M24 9h18v10H24zM24 15l6-6M28 19 38 9M35 19l7-7" />;
    case 'drill':
    case 'bore':
      return (
        <>
          <circle cx={32} cy={14} r={5} />
          <path d="M32 6v16M24 14h16" strokeDasharray="3 2" />
        </>
      );
    case 'fasten':
    case 'fit-hardware':
      return <path d="M12 10l8 8m0-8-8 8M44 10l8 8m0-8-8 8" strokeWidth={2} />;
    case 'crosscut':
      return <path d="M46 0v28" strokeDasharray="4 3" strokeWidth={2} />;
    case 'rip':
    case 'sheet-cut':
      return <path d="M0 9h64" strokeDasharray="4 3" strokeWidth={2} />;
    case 'joint-edge':
    case 'plane':
      return <path d="M2 2h60" strokeWidth={4} />;
    case 'rout':
    case 'shape':
      return <path d="M44 26c10 0 18-6 18-14M54 26l8-6M48 26l14-10" />;
    case 'glue-up':
      return <path d="M2 14h60" strokeWidth={3} strokeDasharray="1 4" strokeLinecap="round" />;
    default:
      return <path d="M16 14h32m-6-5 6 5-6 5" />;
  }
}

/** A part as a pencil would note it: a strip or a panel, what is done to it, grain, and the face mark of a handed one. */
export function PartGlyph({ part, operation, stock }: PartGlyphProps) {
  const mirrored = part.hand === 'right';
  return (
    <svg
      viewBox="0 0 68 40"
      width={68}
      height={40}
      fill="none"
      stroke="currentColor"
      strokeWidth={1.5}
      aria-hidden="true"
    >
      <g transform={mirrored ? 'translate(66 6) scale(-1 1)' : 'translate(2 6)'}>
        <path d={stock === 'sheet' ? 'M1 -4h62v36H1z' : 'M1 1h62v26H1z'} strokeWidth={2} />
        <Work operation={operation} />
        {part.grain !== 'any' && stock === 'sheet' && (
          <path d={part.grain === 'along' ? 'M8 27h20m-5-4 5 4-5 4' : 'M10 28V8m-4 5 4-5 4 5'} />
        )}
        {part.referenceFace && <path d="M44 27l4-7 4 7" strokeWidth={2} />}
      </g>
    </svg>
  );
}
