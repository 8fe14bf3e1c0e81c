'use client';
import type { ReactNode } from 'react';
import { useBenchAddress } from './address';
import { BuildWays } from './build-ways';
import { useBuild } from './build-context';
import { Frame } from './frame';
import { TimerStrip } from '../timers/timer-strip';
import { UndoBar } from './undo-bar';

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
          {foot ?? <BuildWays buildId={build.id} />}
        </div>
      }
    >
      {children}
    </Frame>
  );
}
