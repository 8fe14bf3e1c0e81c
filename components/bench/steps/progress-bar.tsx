interface ProgressBarProps {
  done: number;
  skipped: number;
  inAll: number;
}

/** Progress as a strip of the rule laid flat: done heavy, skipped broken, the rest thin. Said in words beside it. */
export function ProgressBar({ done, skipped, inAll }: ProgressBarProps) {
  const percent = (count: number) => `${inAll === 0 ? 0 : (count / inAll) * 100}%`;
  return (
    <svg className="h-[10px] w-full" aria-hidden="true">
      <line x1="0" x2="100%" y1="50%" y2="50%" stroke="var(--soft)" strokeWidth={1.5} />
      <line x1="0" x2={percent(done)} y1="50%" y2="50%" stroke="var(--iron)" strokeWidth={8} />
      {skipped > 0 && (
        <line
          x1={percent(done)}
          x2={percent(done + skipped)}
          y1="50%"
          y2="50%"
          stroke="var(--iron)"
          strokeWidth={8}
          strokeDasharray="4 4"
        />
      )}
    </svg>
  );
}
