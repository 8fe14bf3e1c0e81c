'use client';
import { useState } from 'react';
import type { TimerView } from '@/lib/domain/glue/timer-view';
import { unlockSound } from '@/lib/device/alarm-sound';
import { Button } from '@/components/ui/button';
import { clockTime } from '../entry/time-words';
import { useClock } from '../entry/use-clock';
import { useActs } from '../shell/act-context';
import { useBuild } from '../shell/build-context';

interface TimerActsProps {
  timer: TimerView;
  name: string;
  foremost: boolean;
}

type TimerEvent = 'first-glue' | 'clamps-on' | 'clamps-off' | 'put-away';

/** What a person tells a timer: clamps on, clamps off, put away. Off before the shortest time asks once more. */
export function TimerActs({ timer, name, foremost }: TimerActsProps) {
  const { build } = useBuild();
  const { act } = useActs();
  const clock = useClock(1_000);
  const [early, setEarly] = useState(false);
  const { phase, timerId, stepId } = timer;

  function tell(event: TimerEvent, said: string, at?: number, note?: string) {
    void unlockSound();
    void act(`${said}, ${name}`, (acts, db) =>
      acts.markTimer(db, {
        buildId: build.id,
        timerId,
        event,
        stepId,
        at: at ?? db.clock(),
        ...(note ? { note } : {}),
      }),
    );
    setEarly(false);
  }

  const kind = foremost ? 'plate' : 'act';
  const size = foremost ? 'text-[2.125rem]!' : 'min-h-[81px]!';
  if (phase === 'open') {
    return (
      <div className="grid gap-3">
        <Button kind={kind} className={size} onClick={() => tell('clamps-on', 'Clamps on')}>
          Clamps on
        </Button>
        <div className="grid grid-cols-2 gap-6">
          <Button
            className="min-h-[81px]!"
            onClick={() => tell('first-glue', 'Begun a minute earlier', timer.startedAt - 60_000)}
          >
            It began 1 min earlier
          </Button>
          <Button className="min-h-[81px]!" onClick={() => tell('put-away', 'Timer put away')}>
            Not glued after all
          </Button>
        </div>
      </div>
    );
  }
  if (phase === 'in-clamps') {
    const tooSoon = timer.earliest !== null && clock < timer.earliest;
    if (tooSoon && early) {
      return (
        <div className="grid gap-3 rounded-plate border-2 border-red border-l-[12px] bg-paper p-4">
          <p>
            The shortest clamp time ends about {clockTime(timer.earliest!)}. A joint let go before may open, and can let
            go while you work on it.
          </p>
          <div className="grid grid-cols-2 gap-6">
            <Button className="min-h-[81px]!" onClick={() => setEarly(false)}>
              Leave them on
            </Button>
            <Button
              kind="danger"
              className="min-h-[81px]!"
              onClick={() => tell('clamps-off', 'Clamps off early', undefined, 'Before the shortest clamp time')}
            >
              Off all the same
            </Button>
          </div>
        </div>
      );
    }
    return (
      <Button
        kind={tooSoon ? 'act' : kind}
        className={tooSoon ? 'min-h-[81px]!' : size}
        onClick={() => (tooSoon ? setEarly(true) : tell('clamps-off', 'Clamps off'))}
      >
        Clamps off
      </Button>
    );
  }
  if (phase === 'put-away') return null;
  return (
    <Button
      kind={phase === 'cured' ? kind : 'act'}
      className={phase === 'cured' ? size : 'min-h-[81px]!'}
      onClick={() => tell('put-away', 'Timer put away')}
    >
      Put the timer away
    </Button>
  );
}
