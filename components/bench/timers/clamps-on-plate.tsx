'use client';
import type { TimerView } from '@/lib/domain/glue/timer-view';
import { Button } from '@/components/ui/button';
import { countdown } from '../entry/time-words';
import { useClock } from '../entry/use-clock';
import { useTellTimer } from './use-tell-timer';

/** One tap when the clamps are tight: open time ends, clamp time begins. */
export function ClampsOnPlate({ timer, name }: { timer: TimerView; name: string }) {
  const tell = useTellTimer(timer, name);
  const clock = useClock(1_000);
  return (
    <Button kind="plate" className="text-[2.125rem]!" onClick={() => tell('clamps-on', 'Clamps on')}>
      Clamps on
      {timer.earliest !== null && (
        <span className="figures block text-[1.25rem] font-medium" aria-hidden="true">
          open time {countdown(timer.earliest - clock)}
        </span>
      )}
    </Button>
  );
}
