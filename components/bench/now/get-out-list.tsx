'use client';
import type { GetOut } from '@/lib/domain/build/get-out';
import type { ReactNode } from 'react';

/** What to get out before starting, so that nothing is looked for with glue on the hands. */
export function GetOutList({ getOut }: { getOut: GetOut }) {
  const { tools, items, parts, clamps, people } = getOut;
  if (tools.length + items.length + parts.length + clamps === 0 && people === 1) return null;
  return (
    <section aria-labelledby="get-out">
      <h2 id="get-out" className="border-b-2 border-iron pb-1 text-[1.5rem]">
        Get out first
      </h2>
      <ul>
        {tools.map((tool) => (
          <Row key={tool}>{tool}</Row>
        ))}
        {clamps > 0 && <Row>{clamps === 1 ? '1 clamp' : `${clamps} clamps`}</Row>}
        {items.map(({ id, item, quantity, unit }) => (
          <Row key={id}>
            {item}
            <Count>
              {quantity} {unit}
            </Count>
          </Row>
        ))}
        {parts.map(({ partId, label, name, pieces, cut }) => (
          <Row key={partId}>
            <span>
              <b className="font-figures font-semibold">{label}</b> {name}
            </span>
            <Count>{cut >= pieces ? `${pieces}` : `${pieces}, ${cut} cut`}</Count>
          </Row>
        ))}
        {people > 1 && <Row>{people} people: this needs help</Row>}
      </ul>
    </section>
  );
}

function Row({ children }: { children: ReactNode }) {
  return (
    <li className="flex min-h-[44px] items-center justify-between gap-4 border-b border-line py-1.5">{children}</li>
  );
}

function Count({ children }: { children: ReactNode }) {
  return <span className="figures shrink-0 font-medium">{children}</span>;
}
