'use client';
import { unlockSound } from '@/lib/device/alarm-sound';
import type { EntryTarget } from '@/lib/domain/build/kinds';
import type { TimerView } from '@/lib/domain/glue/timer-view';
import { useActs } from '../shell/act-context';
import { useBuild } from '../shell/build-context';

type TimerEvent = EntryTarget<'timer-marked'>['event'];

/** Tells a timer what happened, now or at a given time. */
export function useTellTimer({ timerId, stepId }: Pick<TimerView, 'timerId' | 'stepId'>, name: string) {
  const { build } = useBuild();
  const { act } = useActs();
  return (event: TimerEvent, said: string, more: { at?: number; note?: string } = {}) => {
    // A browser allows sound only after a touch, so the tones are readied in this one.
    void unlockSound();
    void act(`${said}, ${name}`, (acts, db) =>
      acts.markTimer(db, { buildId: build.id, timerId, event, stepId, at: db.clock(), ...more }),
    );
  };
}
