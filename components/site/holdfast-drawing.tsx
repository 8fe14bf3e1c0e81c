const hatchFrom = Array.from({ length: 8 }, (_, index) => 324 + index * 10);

/** A holdfast through a bench top, its foot down on a board that waits for the saw: lines, hatch, and blue for the cut. */
export function HoldfastDrawing({ className = '' }: { className?: string }) {
  return (
    <svg
      viewBox="0 0 440 300"
      fill="none"
      stroke="currentColor"
      strokeWidth={2}
      strokeLinecap="round"
      strokeLinejoin="round"
      role="img"
      aria-label="A holdfast through a bench top holds a board down; the part to be cut off is hatched."
      className={className}
    >
      {/* Bench top, cut open at the hole, and its legs. */}
      <path d="M8 172h126v54H8zM170 172h262v54H170z" className="fill-paper" />
      <path d="M40 226v66M80 226v66M360 226v66M400 226v66" />
      <path
        d="M20 190q40-8 70 0t34 0M24 208q36 8 66 0t34 0M184 188q60-8 120 0t116 0M182 208q70 8 130 0t110 0"
        strokeWidth={1}
        opacity={0.4}
      />
      {/* Board: kept, then waste past the cut. */}
      <path d="M196 140h212v32H196z" className="fill-paper" />
      <path d="M206 151q36-6 70 0t36 0M204 162q44 6 106 0" strokeWidth={1} opacity={0.4} />
      {hatchFrom.map((x) => (
        <path key={x} d={`M${x} 169l${Math.min(14, 404 - x)}-26`} strokeWidth={1} />
      ))}
      <path d="M318 126v58" className="stroke-blue" strokeWidth={3} />
      {/* Iron: straight shaft, shoulder, an arm that thins down to its foot. */}
      <path
        d="M141 290V96c0-40 24-62 58-58 34 4 56 34 66 74l19 20c4 4 2 8-4 8h-58c-5 0-6-3-4-8l9-20c-8-28-18-44-32-46-18-3-32 10-32 34v190c0 4-22 4-22 0z"
        fill="currentColor"
        strokeWidth={1}
      />
    </svg>
  );
}
