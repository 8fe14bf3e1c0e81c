/** The hook of a holdfast: a shaft that goes through the bench and an arm that comes down on the work. */
export function Mark({ size = 28, title }: { size?: number; title?: string }) {
  return (
    <svg
      viewBox="0 0 32 40"
      width={(size * 32) / 40}
      height={size}
      fill="none"
      stroke="currentColor"
      strokeWidth={5.5}
      role={title ? 'img' : undefined}
      aria-label={title}
      aria-hidden={title ? undefined : true}
    >
      <path d="M9 38V13C9 6.5 13.5 3.5 18.5 3.5S27 7 28 13.5" />
      <path d="M24.5 15.5h6.5" strokeWidth={4} />
    </svg>
  );
}
