'use client';
import { useEffect, useRef, type ReactNode } from 'react';
import { takeFocusAfter } from './address';

interface ViewHeadingProps {
  /** Changes when the view shows something else, so that the focus moves once for each change. */
  focusKey: string;
  /** A line above the heading: the stage, the build. */
  over?: ReactNode;
  children: ReactNode;
}

/** The heading of a view. It takes the focus when the view has changed, so that a screen reader starts there. */
export function ViewHeading({ focusKey, over, children }: ViewHeadingProps) {
  const heading = useRef<HTMLHeadingElement>(null);
  useEffect(() => {
    if (takeFocusAfter() === 'heading') heading.current?.focus({ preventScroll: true });
  }, [focusKey]);
  return (
    <div>
      {over && <p className="font-figures text-[1.1875rem] font-medium text-soft">{over}</p>}
      <h1 ref={heading} tabIndex={-1} className="text-[2.25rem] outline-none">
        {children}
      </h1>
    </div>
  );
}
