'use client';
import { useId } from 'react';
import { Hatch, hatched } from './hatch';

export interface DiagramPiece {
  key: string;
  /** Mark of the part; empty for a piece that is kept. */
  label: string;
  x: number;
  y: number;
  length: number;
  width: number;
  look: 'part' | 'estimate' | 'kept';
}

interface CuttingDiagramProps {
  length: number;
  width: number;
  pieces: readonly DiagramPiece[];
  /** Whether the grain shows: fine lines along the length. */
  grain: boolean;
  label: string;
}

const DRAWN = 1_000;
/** A board is drawn no flatter than this, so that its marks can be read. */
const LEAST_HEIGHT = 84;
const LETTER = 46;

/** A board or a sheet to scale, its parts with their marks, what is kept in plain paper, waste hatched. */
export function CuttingDiagram({ length, width, pieces, grain, label }: CuttingDiagramProps) {
  const hatch = useId();
  const k = DRAWN / length;
  const height = Math.max(width * k, LEAST_HEIGHT);
  const ky = height / width;
  return (
    <svg role="img" aria-label={label} viewBox={`-2 -2 ${DRAWN + 4} ${height + 4}`} className="w-full">
      <defs>
        <Hatch id={hatch} colour="var(--soft)" pitch={18} />
      </defs>
      <rect
        width={DRAWN}
        height={height}
        fill={hatched(hatch)}
        stroke="var(--iron)"
        strokeWidth={2}
        vectorEffect="non-scaling-stroke"
      />
      {pieces.map((piece) => {
        const [x, y, w, h] = [piece.x * k, piece.y * ky, piece.length * k, piece.width * ky];
        const size = Math.min(LETTER, h * 0.8, (w * 1.5) / Math.max(1, piece.label.length));
        return (
          <g key={piece.key}>
            <rect
              x={x}
              y={y}
              width={w}
              height={h}
              fill={
                piece.look === 'estimate'
                  ? 'var(--amber-ground)'
                  : piece.look === 'kept'
                    ? 'var(--chalk)'
                    : 'var(--paper)'
              }
              stroke={piece.look === 'kept' ? 'var(--soft)' : 'var(--iron)'}
              strokeDasharray={piece.look === 'kept' ? '6 4' : undefined}
              strokeWidth={1.5}
              vectorEffect="non-scaling-stroke"
            />
            {grain && piece.look !== 'kept' && h > 60 && (
              <path
                d={`M${x + w * 0.12} ${y + h * 0.82}H${x + w * 0.88}`}
                stroke="var(--soft)"
                strokeWidth={1}
                vectorEffect="non-scaling-stroke"
              />
            )}
            {piece.label && (
              <text
                x={x + w / 2}
                y={y + h / 2}
                dy="0.36em"
                textAnchor="middle"
                className="figures"
                fontSize={size}
                fontWeight={600}
                fill={piece.look === 'estimate' ? 'var(--on-amber)' : 'var(--iron)'}
              >
                {piece.label}
              </text>
            )}
          </g>
        );
      })}
    </svg>
  );
}
