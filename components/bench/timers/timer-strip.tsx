'use client';
import { findStep } from '@/lib/domain/plan/find';
import { useClock } from '../entry/use-clock';
import { useBenchAddress } from '../shell/address';
import { BenchLink } from '../shell/bench-link';
import { useBuild } from '../shell/build-context';
import { timerWords } from './timer-words';

/** Under the head of every screen: open time that is running, or a time that has ended and wants a look. */
export function TimerStrip() {
  const { build, plan, now } = useBuild();
  const { view } = useBenchAddress();
  const clock = useClock(1_000);
  const pressing = now.timers.find(({ phase }) => phase === 'open') ?? now.timers.find(({ overdue }) => overdue);
  // "What now" has every timer on it already.
  if (!pressing || (view === 'now' && pressing.phase !== 'open')) return null;
  const step = findStep(plan, pressing.stepId);
  return (
    <BenchLink
      to={{ buildId: build.id, view: 'timers', open: pressing.timerId }}
      className="flex min-h-[52px] items-center justify-between gap-3 border-b-2 border-amber bg-amber-ground px-4 font-figures text-[1.25rem] text-on-amber"
    >
      <span className="truncate font-medium">{step?.glueUp?.name ?? step?.title ?? 'Glue-up'}</span>
      <span className="figures shrink-0 font-semibold">{timerWords(pressing, clock)}</span>
    </BenchLink>
  );
}
