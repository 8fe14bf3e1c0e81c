import type { ReactNode } from 'react';

interface WorkingProps {
  /** What is questioned: "44 1/2 in", "40–75 min". */
  of: string;
  rows: readonly { name: string; says: ReactNode }[];
}

/** The working of a computed figure, opened by a tap: formula, inputs, source, how sure it is. */
export function Working({ of, rows }: WorkingProps) {
  return (
    <details className="text-[1.0625rem]">
      <summary className="flex min-h-[48px] items-center font-figures font-medium text-blue underline underline-offset-4">
        How {of} is come by
      </summary>
      <dl className="grid gap-2 border-l-2 border-iron py-1 pl-3">
        {rows.map(({ name, says }) => (
          <div key={name}>
            <dt className="text-soft">{name}</dt>
            <dd>{says}</dd>
          </div>
        ))}
      </dl>
    </details>
  );
}
