'use client';
import type { TimerView } from '@/lib/domain/glue/timer-view';
import { calendarFile } from '@/lib/domain/glue/calendar-file';
import { ActButton } from '../entry/act-button';
import { clockTime, dayAndTime } from '../entry/time-words';
import { saveFile } from '../entry/save-file';
import { useClock } from '../entry/use-clock';
import { PHASE_WORDS } from './timer-words';

/** The phone's own alarm rings whatever happens to this page; a calendar file is an extra that cannot be called back. */
export function AlarmOffer({ timer, name, at }: { timer: TimerView; name: string; at: number }) {
  const clock = useClock(60_000);
  function save() {
    const text = calendarFile({
      uid: `${timer.timerId}-${timer.phase}`,
      title: `${name}: ${timer.phase === 'in-clamps' ? 'clamps may come off' : 'cured'}`,
      description: `${PHASE_WORDS[timer.phase]} since ${clockTime(timer.phaseStartedAt)}. The label of the glue comes first.`,
      at,
      madeAt: Date.now(),
    });
    saveFile(`${timer.phase}.ics`, 'text/calendar', text);
  }
  return (
    <div className="flex flex-wrap items-center justify-between gap-3">
      <p>
        Also set your phone’s alarm for <b className="figures">{dayAndTime(at, clock)}</b>.
      </p>
      <ActButton onClick={save}>Calendar file</ActButton>
    </div>
  );
}
