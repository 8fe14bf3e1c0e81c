interface Stage {
  stageId: string;
  done: number;
  skipped: number;
  inAll: number;
}

/**
 * A rule laid flat: one graduation a step, longer where a stage begins; within a stage first what is done, heavy, then
 * what was skipped, broken. Its words stand beside it.
 */
export function ProgressRule({ stages }: { stages: readonly Stage[] }) {
  const marks = stages.flatMap(({ stageId, done, skipped, inAll }) =>
    Array.from({ length: inAll }, (_, i) => ({
      key: `${stageId}/${i}`,
      top: i === 0 ? 2 : 11,
      mark: i < done ? 'done' : i < done + skipped ? 'skipped' : 'open',
    })),
  );
  return (
    <svg
      viewBox={`0 0 ${marks.length * 10} 24`}
      preserveAspectRatio="none"
      className="h-6 w-full"
      fill="none"
      aria-hidden="true"
    >
      <path d={`M0 23H${marks.length * 10}`} stroke="var(--iron)" strokeWidth="2" vectorEffect="non-scaling-stroke" />
      {marks.map(({ key, top, mark }, i) => (
        <path
          key={key}
          d={`M${i * 10 + 5} ${top}V22`}
          stroke={mark === 'done' ? 'var(--iron)' : 'var(--soft)'}
          strokeWidth={mark === 'done' ? 4 : 1}
          strokeDasharray={mark === 'skipped' ? '3 3' : undefined}
          vectorEffect="non-scaling-stroke"
        />
      ))}
    </svg>
  );
}
