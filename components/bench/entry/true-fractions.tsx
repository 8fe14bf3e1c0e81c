import { Fragment, type ReactNode } from 'react';

/** A fraction as rulers have it: a power of two under the line, less than one; "5/4 oak" is a name and stays as it is. */
const FRACTION = /(?<![\d/])(\d{1,3})\/(2|4|8|16|32|64|128)(?![\d/])/g;

/** Words of a plan with their fractions set as true ones. */
export function TrueFractions({ text }: { text: string }): ReactNode {
  const parts: ReactNode[] = [];
  let from = 0;
  for (const match of text.matchAll(FRACTION)) {
    if (Number(match[1]) >= Number(match[2])) continue;
    parts.push(
      <Fragment key={from}>{text.slice(from, match.index)}</Fragment>,
      <span key={match.index} className="fraction">
        {match[0]}
      </span>,
    );
    from = match.index + match[0].length;
  }
  return parts.length === 0 ? text : [...parts, <Fragment key={from}>{text.slice(from)}</Fragment>];
}

/** The same for what a Markdown renderer hands over: its bare texts are set, everything else is left. */
export function withTrueFractions(children: ReactNode): ReactNode {
  if (typeof children === 'string') return <TrueFractions text={children} />;
  if (!Array.isArray(children)) return children;
  return children.map((child: ReactNode, index) =>
    typeof child === 'string' ? <TrueFractions key={index} text={child} /> : child,
  );
}
