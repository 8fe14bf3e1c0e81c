'use client';
import type { ReactNode } from 'react';
import { SyncBadge } from '@/components/sync/sync-badge';
import { Mark } from '@/components/ui/mark';
import { goTo, type BenchAddress } from './address';
import { BenchLink } from './bench-link';

interface FrameProps {
  /** The build's name, or the program's where there is none. */
  title: string;
  /** Where the hook and the title lead. */
  home: Partial<BenchAddress>;
  /** A line of notices right under the head: a timer that runs, an update that waits. */
  notices?: ReactNode;
  /** Words at the foot. */
  foot?: ReactNode;
  /** `page` scrolls as one; `step` lays out its own rule, text and plate. */
  layout?: 'page' | 'step';
  children: ReactNode;
}

/** Head, body and foot of every bench screen. The emergency card and what is held here are one tap away on all of them. */
export function Frame({ title, home, notices, foot, layout = 'page', children }: FrameProps) {
  const buildId = home.buildId ?? null;
  return (
    <div className="bench">
      <div>
        <header className="bench-head">
          <BenchLink to={home} className="flex min-w-0 items-center gap-2 pr-2 pl-4 active:bg-line">
            <Mark size={28} />
            <span className="truncate font-figures text-[1.375rem] font-semibold">{title}</span>
          </BenchLink>
          <nav aria-label="Always at hand" className="flex shrink-0">
            <SyncBadge onOpen={() => goTo({ view: 'sync', buildId })} />
            <BenchLink
              to={{ view: 'emergency', buildId }}
              className="flex items-center px-3 font-figures text-[1.0625rem] font-semibold text-red active:bg-line"
            >
              Emergency
            </BenchLink>
          </nav>
        </header>
        {notices}
      </div>
      {layout === 'page' ? (
        // Can have the focus, so that a screen that is only read scrolls by the keyboard too.
        <main className="bench-main" tabIndex={0}>
          {children}
        </main>
      ) : (
        children
      )}
      {foot ?? <div />}
    </div>
  );
}
