'use client';
import { useState } from 'react';
import type { TimerView } from '@/lib/domain/glue/timer-view';
import { Button } from '@/components/ui/button';
import { ActButton } from '../entry/act-button';
import { clockTime } from '../entry/time-words';
import { useClock } from '../entry/use-clock';
import { useTellTimer } from './use-tell-timer';

interface TimerPlateProps {
  timer: TimerView;
  name: string;
  /** The foremost timer's act is the plate at the thumb; the others' are acts in their cards. */
  foremost: boolean;
}

/** What a person tells a timer next: clamps on, clamps off, put away. Off before the shortest time asks once more. */
export function TimerPlate({ timer, name, foremost }: TimerPlateProps) {
  const tell = useTellTimer(timer, name);
  const clock = useClock(1_000);
  const [early, setEarly] = useState(false);
  const { phase } = timer;
  const tooSoon = phase === 'in-clamps' && timer.earliest !== null && clock < timer.earliest;
  if (tooSoon && early) {
    return (
      <div className="grid gap-3 rounded-plate border-2 border-l-[12px] border-red bg-paper p-4">
        <p>
          The shortest clamp time ends about {clockTime(timer.earliest!)}. A joint let go before may open, and can let
          go while you work on it.
        </p>
        <div className="grid grid-cols-2 gap-6">
          <ActButton onClick={() => setEarly(false)}>Leave them on</ActButton>
          <ActButton
            kind="danger"
            onClick={() => {
              tell('clamps-off', 'Clamps off early', { note: 'Before the shortest clamp time' });
              setEarly(false);
            }}
          >
            Off all the same
          </ActButton>
        </div>
      </div>
    );
  }
  const [word, press] = nextAct(phase, tell, tooSoon ? () => setEarly(true) : null);
  if (!press) return null;
  if (foremost && !tooSoon && phase !== 'curing') {
    return (
      <Button kind="plate" className="text-[2.125rem]!" onClick={press}>
        {word}
      </Button>
    );
  }
  return (
    <ActButton className="w-full" onClick={press}>
      {word}
    </ActButton>
  );
}

function nextAct(
  phase: TimerView['phase'],
  tell: ReturnType<typeof useTellTimer>,
  ask: (() => void) | null,
): [string, (() => void) | null] {
  switch (phase) {
    case 'open':
      return ['Clamps on', () => tell('clamps-on', 'Clamps on')];
    case 'in-clamps':
      return ['Clamps off', ask ?? (() => tell('clamps-off', 'Clamps off'))];
    case 'curing':
    case 'cured':
      return ['Put the timer away', () => tell('put-away', 'Timer put away')];
    default:
      return ['', null];
  }
}
