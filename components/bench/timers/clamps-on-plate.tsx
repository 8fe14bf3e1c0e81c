'use client';
import type { TimerView } from '@/lib/domain/glue/timer-view';
import { unlockSound } from '@/lib/device/alarm-sound';
import { Button } from '@/components/ui/button';
import { countdown } from '../entry/time-words';
import { useClock } from '../entry/use-clock';
import { useActs } from '../shell/act-context';
import { useBuild } from '../shell/build-context';

/** One tap when the clamps are tight: open time ends, clamp time begins. */
export function ClampsOnPlate({ timer }: { timer: TimerView }) {
  const { build } = useBuild();
  const { act } = useActs();
  const clock = useClock(1_000);

  function tighten() {
    void unlockSound();
    void act('Clamps on', (acts, db) =>
      acts.markTimer(db, {
        buildId: build.id,
        timerId: timer.timerId,
        event: 'clamps-on',
        stepId: timer.stepId,
        at: db.clock(),
      }),
    );
  }

  return (
    <Button kind="plate" className="text-[2.125rem]!" onClick={tighten}>
      Clamps on
      {timer.earliest !== null && (
        <span className="figures block text-[1.25rem] font-medium" aria-hidden="true">
          open time {countdown(timer.earliest - clock)}
        </span>
      )}
    </Button>
  );
}
