'use client';
import { createContext, useContext, useEffect, useRef, useState, type ReactNode } from 'react';
import { playTone } from '@/lib/device/alarm-sound';
import { notify } from '@/lib/device/notify';
import { keepScreenOn } from '@/lib/device/wake-lock';
import { findStep } from '@/lib/domain/plan/find';
import { Button } from '@/components/ui/button';
import { clockTime } from '../entry/time-words';
import { useClock } from '../entry/use-clock';
import { benchPath } from '../shell/address';
import { useAnnounce } from '../shell/announcer';
import { useBuild } from '../shell/build-context';
import { alarmPoints, dueBetween, type AlarmPoint } from './alarm-points';

const ScreenOnContext = createContext(false);

/** Whether the screen is being kept on for a running open time. */
export const useScreenOn = () => useContext(ScreenOnContext);

/**
 * Watches the build's timers while it is open: tones, a large flash and a notification when a time is due, and the
 * screen kept on while an open time runs. Times are absolute, so what fell due behind a dark screen is told on return.
 */
export function TimerWatch({ children }: { children: ReactNode }) {
  const { build, plan, now } = useBuild();
  const announce = useAnnounce();
  const clock = useClock(1_000);
  const seenUpTo = useRef(clock);
  const [ringing, setRinging] = useState<AlarmPoint | null>(null);
  const [screenOn, setScreenOn] = useState(false);
  const openRuns = now.timers.some(({ phase, overdue }) => phase === 'open' && !overdue);

  useEffect(() => {
    const due = now.timers
      .flatMap((timer) => {
        const step = findStep(plan, timer.stepId);
        const points = alarmPoints(timer, step?.glueUp?.name ?? step?.title ?? 'Glue-up');
        return dueBetween(points, seenUpTo.current, clock).map((point) => ({ point, timerId: timer.timerId }));
      })
      .sort((a, b) => a.point.at - b.point.at);
    seenUpTo.current = clock;
    const last = due.at(-1);
    if (!last) return;
    const ends = due.filter(({ point }) => point.tone === 'end');
    playTone(ends.length > 0 ? 'end' : 'half');
    announce(due.map(({ point }) => point.words).join('. '));
    if (ends.length === 0) return;
    setRinging(ends.at(-1)!.point);
    void notify({
      title: last.point.words,
      body: `Due at ${clockTime(last.point.at)}`,
      tag: last.timerId,
      address: benchPath({ buildId: build.id, view: 'timers', open: last.timerId }),
    });
  }, [announce, build.id, clock, now.timers, plan]);

  useEffect(() => (openRuns ? keepScreenOn(setScreenOn) : undefined), [openRuns]);

  return (
    <ScreenOnContext.Provider value={openRuns && screenOn}>
      {children}
      {ringing && <Ringing point={ringing} onSeen={() => setRinging(null)} />}
    </ScreenOnContext.Provider>
  );
}

function Ringing({ point, onSeen }: { point: AlarmPoint; onSeen: () => void }) {
  const dialog = useRef<HTMLDialogElement>(null);
  useEffect(() => dialog.current?.showModal(), []);
  return (
    <dialog
      ref={dialog}
      onClose={onSeen}
      aria-labelledby="ringing"
      className="time-is-up m-0 h-dvh max-h-none w-dvw max-w-none flex-col justify-between gap-6 bg-amber-ground p-5 text-on-amber open:flex"
    >
      <p id="ringing" className="pt-[12vh] font-figures text-[min(4rem,14vw)] leading-[1.05] font-semibold">
        {point.words}
      </p>
      <Button kind="plate" autoFocus onClick={() => dialog.current?.close()}>
        Seen
      </Button>
    </dialog>
  );
}
