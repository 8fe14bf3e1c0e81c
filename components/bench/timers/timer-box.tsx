'use client';
import type { TimerView } from '@/lib/domain/glue/timer-view';
import { findStep } from '@/lib/domain/plan/find';
import { useClock } from '../entry/use-clock';
import { BenchLink } from '../shell/bench-link';
import { useBuild } from '../shell/build-context';
import { PHASE_WORDS, timerWords } from './timer-words';

/** A running timer in a box: amber while it waits, green when it has done so, red where an open time ran out. */
export function TimerBox({ timer }: { timer: TimerView }) {
  const { build, plan } = useBuild();
  const clock = useClock(timer.phase === 'open' ? 1_000 : 15_000);
  const step = findStep(plan, timer.stepId);
  const done = timer.phase === 'cured' || (timer.phase !== 'open' && timer.overdue);
  const lost = timer.phase === 'open' && timer.overdue;
  const look = lost
    ? 'border-red bg-paper text-red'
    : done
      ? 'border-green bg-paper'
      : 'border-amber bg-amber-ground text-on-amber';
  return (
    <BenchLink
      to={{ buildId: build.id, view: 'timers', open: timer.timerId }}
      className={`block min-h-[81px] rounded-plate border-2 px-4 py-2.5 active:brightness-90 ${look}`}
    >
      <span className="block font-figures text-[1.0625rem] font-medium">
        {step?.glueUp?.name ?? step?.title ?? 'Glue-up'}, {PHASE_WORDS[timer.phase]}
      </span>
      <span className={`figures block text-[1.5rem] leading-tight font-semibold ${done ? 'text-green' : ''}`}>
        {timerWords(timer, clock)}
      </span>
    </BenchLink>
  );
}
