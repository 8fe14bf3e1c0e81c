/** A rule laid flat: one graduation a step, done ones heavy. Its words stand beside it. */
export function ProgressRule({ done, skipped, inAll }: { done: number; skipped: number; inAll: number }) {
  return (
    <svg viewBox={`0 0 ${inAll * 10} 24`} preserveAspectRatio="none" className="h-6 w-full" aria-hidden="true">
      <path d={`M0 23H${inAll * 10}`} stroke="var(--iron)" strokeWidth="2" />
      {Array.from({ length: inAll }, (_, i) => (
        <path
          key={i}
          d={`M${i * 10 + 5} ${i % 5 === 0 ? 4 : 10}V22`}
          stroke={i < done ? 'var(--iron)' : 'var(--soft)'}
          strokeWidth={i < done ? 5 : 1}
          strokeDasharray={i >= done && i < done + skipped ? '3 3' : undefined}
        />
      ))}
    </svg>
  );
}
