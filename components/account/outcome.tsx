'use client';
import type { ReactNode } from 'react';

interface OutcomeProps {
  title: string;
  children: ReactNode;
}

/** What stands in a form's place once it is done. It takes the focus, so that it is read out and the keyboard goes on from it. */
export function Outcome({ title, children }: OutcomeProps) {
  return (
    <section
      tabIndex={-1}
      ref={(element) => element?.focus()}
      aria-labelledby="outcome"
      className="grid gap-4 rounded-[3px] border-2 border-green bg-paper px-4 py-4 text-lg outline-none"
    >
      <h2 id="outcome" className="text-2xl text-green">
        {title}
      </h2>
      {children}
    </section>
  );
}
