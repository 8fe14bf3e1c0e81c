'use client';
import type { ReactNode } from 'react';
import { useBenchAddress, type BenchView } from './address';
import { BenchLink } from './bench-link';
import { useBuild } from './build-context';
import { Frame } from './frame';
import { TimerStrip } from '../timers/timer-strip';
import { UndoBar } from './undo-bar';

const WAYS: readonly { view: BenchView; word: string }[] = [
  { view: 'now', word: 'What now' },
  { view: 'steps', word: 'Steps' },
  { view: 'cuts', word: 'Cut list' },
  { view: 'timers', word: 'Timers' },
  { view: 'more', word: 'More' },
];

interface BuildFrameProps {
  /** Other words at the foot than the ways about the build. */
  foot?: ReactNode;
  layout?: 'page' | 'step';
  children: ReactNode;
}

/** Frame of a screen of one build: running timers under the head, the undo and the ways about at the foot. */
export function BuildFrame({ foot, layout, children }: BuildFrameProps) {
  const { build } = useBuild();
  const { view } = useBenchAddress();
  return (
    <Frame
      title={build.name}
      home={{ buildId: build.id }}
      layout={layout}
      notices={view !== 'timers' && view !== 'step' && <TimerStrip />}
      foot={
        <div>
          <UndoBar />
          {foot ?? <Ways buildId={build.id} here={view} />}
        </div>
      }
    >
      {children}
    </Frame>
  );
}

function Ways({ buildId, here }: { buildId: string; here: BenchView }) {
  return (
    <nav className="bench-foot" aria-label="This build">
      {WAYS.map(({ view, word }) => (
        <BenchLink
          key={view}
          to={{ buildId, view }}
          aria-current={view === here ? 'page' : undefined}
          className={`flex items-center justify-center text-center font-figures text-[1.125rem] font-medium active:bg-line ${
            view === here ? 'shadow-[inset_0_4px_0_var(--iron)]' : ''
          }`}
        >
          {word}
        </BenchLink>
      ))}
    </nav>
  );
}
