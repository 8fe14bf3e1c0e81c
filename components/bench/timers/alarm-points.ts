import type { TimerView } from '@/lib/domain/glue/timer-view';

export interface AlarmPoint {
  /** ms since 1970. */
  at: number;
  tone: 'half' | 'end';
  /** Said, shown large, and notified. */
  words: string;
}

/** When a timer makes itself heard in its phase. A cure ends without haste, so it rings once, at its latest end. */
export function alarmPoints(timer: TimerView, name: string): AlarmPoint[] {
  const { phase, phaseStartedAt, earliest, latest } = timer;
  if (earliest === null || latest === null) return [];
  if (phase === 'open') {
    return [
      {
        at: phaseStartedAt + (earliest - phaseStartedAt) / 2,
        tone: 'half',
        words: `${name}: half of the open time is gone`,
      },
      { at: earliest, tone: 'end', words: `${name}: close the joint now` },
    ];
  }
  if (phase === 'in-clamps') {
    const points: AlarmPoint[] = [{ at: latest, tone: 'end', words: `${name}: clamp time is over` }];
    if (earliest < latest)
      points.unshift({ at: earliest, tone: 'half', words: `${name}: the shortest clamp time is over` });
    return points;
  }
  if (phase === 'curing' || phase === 'cured') return [{ at: latest, tone: 'end', words: `${name}: cured` }];
  return [];
}

/** Points that fell due after `since`, up to `now`. */
export function dueBetween(points: readonly AlarmPoint[], since: number, now: number): AlarmPoint[] {
  return points.filter(({ at }) => at > since && at <= now);
}
