'use client';
import { progressOf } from '@/lib/domain/build/progress';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { minutesWords } from '../entry/time-words';
import { useClock } from '../entry/use-clock';
import { goTo } from '../shell/address';
import { useBuild } from '../shell/build-context';

/** Every step is done or skipped: what was worked, and the way to look back. */
export function FinishedNotice() {
  const { build, plan, state, now } = useBuild();
  const clock = useClock(60_000);
  const { stepsDone, stepsSkipped, minutesWorked } = progressOf(plan, state, clock);
  return (
    <>
      <Notice tone="done" title="The piece is built.">
        {stepsDone} steps done{stepsSkipped > 0 ? `, ${stepsSkipped} skipped` : ''}
        {minutesWorked > 0 && `, ${minutesWords({ min: minutesWorked, max: minutesWorked })} of work`}.
        {now.timers.length > 0 && ' Something still cures: leave it its time before use.'}
      </Notice>
      <Button kind="plate" onClick={() => goTo({ buildId: build.id, view: 'log' })}>
        Look back
      </Button>
    </>
  );
}
