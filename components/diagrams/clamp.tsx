interface ClampProps {
  /** When the phase began, ms. */
  from: number;
  earliest: number;
  latest: number;
  now: number;
  /** `open`: an open time, past whose end a joint is lost; `wait`: clamp time or cure, past whose end it is done. */
  purpose: 'open' | 'wait';
  /** What the drawing says, in words. */
  label: string;
}

const PIECE_LEFT = 40;
const PIECE_RIGHT = 268;

/**
 * A bar clamp whose jaw closes over the piece as time goes. The piece's edge towards the head is the end of the time:
 * earliest solid, latest dashed; half-way is a dashed line. Past the end an open time is red, a wait is green.
 */
export function Clamp({ from, earliest, latest, now, purpose, label }: ClampProps) {
  const total = Math.max(1, latest - from);
  const share = (ms: number) => Math.min(1, Math.max(0, (ms - from) / total));
  const place = (ms: number) => PIECE_RIGHT - share(ms) * (PIECE_RIGHT - PIECE_LEFT);
  const jaw = place(now);
  const past = now >= (purpose === 'open' ? earliest : latest);
  const colour = past ? (purpose === 'open' ? 'var(--red)' : 'var(--green)') : 'var(--amber)';
  const half = place(from + (earliest - from) / 2);
  return (
    <svg role="img" aria-label={label} viewBox="0 0 360 76" className="w-full max-w-[30rem]" fill="none">
      <rect x={6} y={46} width={348} height={12} stroke="var(--iron)" strokeWidth={2.5} />
      <rect
        x={PIECE_LEFT}
        y={14}
        width={PIECE_RIGHT - PIECE_LEFT}
        height={30}
        fill="var(--amber-ground)"
        opacity={0.45}
      />
      <rect x={PIECE_LEFT} y={14} width={Math.max(0, jaw - PIECE_LEFT)} height={30} fill="var(--amber-ground)" />
      <path
        d={`M${PIECE_LEFT} 14H${PIECE_RIGHT}M${PIECE_LEFT} 44H${PIECE_RIGHT}`}
        stroke="var(--iron)"
        strokeWidth={2}
      />
      <path d={`M${place(earliest)} 10V46`} stroke="var(--iron)" strokeWidth={3} />
      <path d={`M${PIECE_LEFT + 1} 10V46`} stroke="var(--iron)" strokeWidth={2.5} strokeDasharray="5 3" />
      <path d={`M${half} 15V43`} stroke="var(--iron)" strokeWidth={1.5} strokeDasharray="3 3" />
      <rect x={10} y={4} width={26} height={66} fill="var(--iron)" />
      <g transform={`translate(${jaw} 0)`} className="motion-safe:transition-transform" fill={colour}>
        <rect x={0} y={4} width={26} height={66} />
        <path d="M26 18h34m-30-5v10m9-10v10m9-10v10" stroke={colour} strokeWidth={3} />
        <rect x={58} y={8} width={12} height={20} />
      </g>
    </svg>
  );
}
