import type { TimerPhase, TimerView } from '@/lib/domain/glue/timer-view';
import { countdown, leftWords, spanWords } from '../entry/time-words';

export const PHASE_WORDS: Record<TimerPhase, string> = {
  open: 'open time',
  'in-clamps': 'in clamps',
  curing: 'curing',
  cured: 'cured',
  'put-away': 'put away',
};

/** How a timer stands in a few words: "38–53 min", "4:10 left", "finished 2 h 10 min ago". */
export function timerWords(timer: TimerView, now: number): string {
  const { phase, earliest, latest } = timer;
  if (phase === 'put-away') return 'Put away';
  if (earliest === null || latest === null) return `Since ${spanWords(now - timer.phaseStartedAt)}`;
  if (phase === 'cured') return `Cured ${spanWords(now - latest)} ago`;
  if (phase === 'open') {
    if (now < earliest) return `${countdown(earliest - now)} left`;
    if (now < latest) return `Past the short end: ${countdown(latest - now)} at most`;
    return `Ran out ${spanWords(now - latest)} ago`;
  }
  if (now >= latest) return `Finished ${spanWords(now - latest)} ago`;
  return leftWords(earliest, latest, now);
}
