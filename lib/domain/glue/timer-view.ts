import type { TimerTimes } from '../build/views';
import type { GlueWindows, Window } from './windows';

export type TimerPhase = 'open' | 'in-clamps' | 'curing' | 'cured' | 'put-away';

/** Where a glue timer stands. All times are absolute, ms since 1970, so sleep, reload and restart change nothing. */
export interface TimerView {
  timerId: string;
  stepId: string;
  phase: TimerPhase;
  /** First glue. */
  startedAt: number;
  phaseStartedAt: number;
  /** End of the phase: earliest solid, latest dashed. Null where the times of the glue are unknown. */
  earliest: number | null;
  latest: number | null;
  /** Past the latest end of open or clamp time: someone should look. */
  overdue: boolean;
  /** How long past, ms; 0 when not overdue. */
  overdueMs: number;
  /** Clamps came off before the shortest clamp time. */
  clampsOffEarly: boolean;
  /** Full pressure came later than the longest assembly time. */
  pressedLate: boolean;
  /** While the glue is open: by when full pressure must be on, cautiously and at the very last; null later or unknown. */
  pressBy: { earliest: number; latest: number } | null;
}

const MINUTE = 60_000;

/**
 * Phase of a timer at `now`: open from first glue to clamps on, in clamps until someone says they are off, curing until
 * the latest end of cure, then cured. Time alone never ends the first two: only a person does. Glue that went on colder
 * than it may has no clamp or cure time at all, so it never counts as cured.
 */
export function timerView(timer: TimerTimes, windows: GlueWindows, now: number): TimerView {
  const startedAt = timer.times['first-glue']!;
  const clampsOn = timer.times['clamps-on'];
  const clampsOff = timer.times['clamps-off'];
  const base = { timerId: timer.timerId, stepId: timer.stepId, startedAt };
  const { open, assembly, clamp, cure } = rangesOf(windows);
  const early =
    clamp !== null && clampsOn !== undefined && clampsOff !== undefined && clampsOff < clampsOn + clamp.min * MINUTE;
  const late = assembly !== null && clampsOn !== undefined && clampsOn > startedAt + assembly.max * MINUTE;
  const view = (
    phase: TimerPhase,
    phaseStartedAt: number,
    range: Window | null,
    due: 'latest' | 'never',
  ): TimerView => {
    const earliest = range && phaseStartedAt + range.min * MINUTE;
    const latest = range && phaseStartedAt + range.max * MINUTE;
    const dueAt = due === 'never' ? null : latest;
    const overdue = dueAt !== null && now >= dueAt;
    return {
      ...base,
      phase,
      phaseStartedAt,
      earliest,
      latest,
      overdue,
      overdueMs: overdue ? now - dueAt : 0,
      clampsOffEarly: early,
      pressedLate: late,
      pressBy:
        phase === 'open' && assembly !== null
          ? { earliest: startedAt + assembly.min * MINUTE, latest: startedAt + assembly.max * MINUTE }
          : null,
    };
  };
  if (timer.times['put-away'] !== undefined) return view('put-away', timer.times['put-away'], null, 'never');
  if (clampsOn === undefined) return view('open', startedAt, open, 'latest');
  if (clampsOff === undefined) return view('in-clamps', clampsOn, clamp, 'latest');
  const curing = view('curing', clampsOn, cure, 'never');
  return curing.latest !== null && now >= curing.latest ? { ...curing, phase: 'cured' } : curing;
}

function rangesOf(windows: GlueWindows): Record<'open' | 'assembly' | 'clamp' | 'cure', Window | null> {
  if (!windows.known) return { open: null, assembly: null, clamp: null, cure: null };
  const sets = windows.temperature !== 'too-cold';
  return {
    open: windows.open,
    assembly: windows.totalAssembly,
    clamp: sets ? windows.clamp : null,
    cure: sets ? windows.cure : null,
  };
}
