'use client';
import { useId } from 'react';
import type { Length } from '@/lib/domain/measure';
import type { PlanFace } from '@/lib/domain/plan/document';
import { Hatch, hatched } from './hatch';

interface FaceMapProps {
  face: PlanFace;
  length: Length;
  width: Length;
  /** Step shown: its fasteners and cuts are blue. */
  stepId: string;
  /** Steps that are done: their fasteners are in, their cuts are made. */
  done: ReadonlySet<string>;
  format: (length: Length) => string;
}

const DRAWN_WIDTH = 1_000;

/**
 * One face with its fasteners (crosses; temporary ones ringed, taken out ones left off) and the cuts still to come, each
 * with its margin hatched red: no metal may stay there. Dimensions stand outside.
 */
export function FaceMap({ face, length, width, stepId, done, format }: FaceMapProps) {
  const hatch = useId();
  // Drawn a thousand wide: browsers cut font sizes off at ten thousand, and a face has hundreds of thousands of units.
  const k = DRAWN_WIDTH / Math.max(length, width);
  const [across, up] = [length * k, width * k];
  const pad = 90;
  const cross = 16;
  const fasteners = face.fasteners.filter(({ removedIn }) => !removedIn || !done.has(removedIn));
  const y = (fromLowerEdge: number) => up - fromLowerEdge * k;
  return (
    <svg
      role="img"
      aria-label={describe(face, fasteners, stepId, done)}
      viewBox={`${-pad} ${-pad * 0.3} ${across + pad * 1.3} ${up + pad * 1.3}`}
      className="max-h-80 w-full"
      fill="none"
    >
      <defs>
        <Hatch id={hatch} colour="var(--red)" pitch={DRAWN_WIDTH / 48} />
      </defs>
      <rect
        width={across}
        height={up}
        fill="var(--paper)"
        stroke="var(--iron)"
        strokeWidth={2}
        vectorEffect="non-scaling-stroke"
      />
      {face.cuts.map((cut) => {
        const made = done.has(cut.step);
        const m = cut.margin;
        return (
          <g key={cut.id}>
            {!made && (
              <rect
                x={(cut.x - m) * k}
                y={y(cut.y + cut.width + m)}
                width={(cut.length + 2 * m) * k}
                height={(cut.width + 2 * m) * k}
                fill={hatched(hatch)}
                stroke="var(--red)"
                strokeWidth={1.5}
                strokeDasharray="4 3"
                vectorEffect="non-scaling-stroke"
              />
            )}
            <rect
              x={cut.x * k}
              y={y(cut.y + cut.width)}
              width={cut.length * k}
              height={cut.width * k}
              stroke={cut.step === stepId ? 'var(--blue)' : made ? 'var(--iron)' : 'var(--red)'}
              strokeWidth={2}
              vectorEffect="non-scaling-stroke"
            />
          </g>
        );
      })}
      {fasteners.map((fastener) => {
        const colour = fastener.step === stepId || fastener.removedIn === stepId ? 'var(--blue)' : 'var(--iron)';
        return (
          <g key={fastener.id} transform={`translate(${fastener.x * k} ${y(fastener.y)})`} stroke={colour}>
            <path
              d={`M${-cross} ${-cross}L${cross} ${cross}M${-cross} ${cross}L${cross} ${-cross}`}
              strokeWidth={2.5}
              vectorEffect="non-scaling-stroke"
              strokeDasharray={done.has(fastener.step) || fastener.step === stepId ? undefined : '2 2'}
            />
            {fastener.temporary && <circle r={cross * 1.9} strokeWidth={1.5} vectorEffect="non-scaling-stroke" />}
          </g>
        );
      })}
      <g className="figures" fill="var(--soft)" fontSize={54} fontWeight={500}>
        <text x={across / 2} y={up + pad * 0.75} textAnchor="middle">
          {format(length)}
        </text>
        <text transform={`translate(${-pad * 0.3} ${up / 2}) rotate(-90)`} textAnchor="middle">
          {format(width)}
        </text>
      </g>
    </svg>
  );
}

function describe(face: PlanFace, fasteners: PlanFace['fasteners'], stepId: string, done: ReadonlySet<string>): string {
  const now = fasteners.filter(({ step }) => step === stepId).length;
  const out = fasteners.filter(({ removedIn }) => removedIn === stepId).length;
  const toCome = face.cuts.filter(({ step }) => !done.has(step));
  return [
    `${face.name}, ${face.orientation}.`,
    now > 0 && `${now} fasteners go in at this step.`,
    out > 0 && `${out} come out at this step.`,
    `${fasteners.length} fasteners in all.`,
    toCome.length > 0 && `Keep clear: ${toCome.map(({ name }) => name).join(', ')}.`,
  ]
    .filter(Boolean)
    .join(' ');
}
