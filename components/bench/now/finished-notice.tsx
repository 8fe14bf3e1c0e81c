'use client';
import { progressOf } from '@/lib/domain/build/progress';
import { Notice } from '@/components/ui/notice';
import { minutesWords } from '../entry/time-words';
import { useClock } from '../entry/use-clock';
import { useBuild } from '../shell/build-context';

/** Every step is done or skipped: what was worked. */
export function FinishedNotice() {
  const { plan, state, now } = useBuild();
  const clock = useClock(60_000);
  const { stepsDone, stepsSkipped, minutesWorked } = progressOf(plan, state, clock);
  return (
    <Notice tone="done" title="The piece is built.">
      {stepsDone} steps done{stepsSkipped > 0 ? `, ${stepsSkipped} skipped` : ''}
      {minutesWorked > 0 && `, ${minutesWords({ min: minutesWorked, max: minutesWorked })} of work`}.
      {now.timers.length > 0 && ' Something still cures: leave it its time before use.'}
    </Notice>
  );
}
