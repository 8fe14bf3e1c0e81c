import { Fragment, type ReactNode } from 'react';

/**
 * A fraction as rulers have it, with the whole number before it if there is one: a power of two under the line and less
 * than one above it. "5/4 oak" is a name and stays as it is.
 */
const FRACTION = /(?<![\d/.])(?:(\d{1,4})[ -])?(\d{1,3})\/(2|4|8|16|32|64|128)(?![\d/])/g;

/** Words of a plan with their fractions set as true ones, in the family that has them all. */
export function TrueFractions({ text }: { text: string }): ReactNode {
  const parts: ReactNode[] = [];
  let from = 0;
  for (const match of text.matchAll(FRACTION)) {
    const [all, whole, above, below] = match;
    if (Number(above) >= Number(below)) continue;
    parts.push(
      <Fragment key={`text ${from}`}>{text.slice(from, match.index)}</Fragment>,
      <span key={`fraction ${match.index}`} className="figures text-[1.06em] whitespace-nowrap">
        {whole}
        {/* The space is for those who copy or hear it; what is seen is the narrow gap. */}
        {whole && <span className="text-[0.5em]"> </span>}
        <span className="fraction">
          {above}/{below}
        </span>
      </span>,
    );
    from = match.index + all.length;
  }
  return parts.length === 0 ? text : [...parts, <Fragment key={`text ${from}`}>{text.slice(from)}</Fragment>];
}

/** The same for what a Markdown renderer hands over: its bare texts are set, everything else is left. */
export function withTrueFractions(children: ReactNode): ReactNode {
  if (typeof children === 'string') return <TrueFractions text={children} />;
  if (!Array.isArray(children)) return children;
  return children.map((child: ReactNode, index) =>
    typeof child === 'string' ? <TrueFractions key={index} text={child} /> : child,
  );
}
