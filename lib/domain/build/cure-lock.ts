import type { Joint } from './glue-timers';
import type { Lock } from './lock';

export const CURE_DANGER = 'A joint put under stress before its glue has set can let go while you work on it.';

export interface CureNeed {
  /** Step of the glue-up. */
  before: string;
  /** "step 11, Glue the lid" */
  name: string;
  need: 'clamps-off' | 'cured';
  joint: Joint | undefined;
  now: number;
  formatTime?: (ms: number) => string;
}

/**
 * The lock of glue that is not known to hold yet, or null. It opens by time only where the times are known and a timer
 * was started; everything else a person must answer for. For `clamps-off` the clamps must be off and the shortest clamp
 * time be over, for `cured` the longest cure.
 */
export function cureLock({ before, name, need, joint, now, formatTime }: CureNeed): Lock | null {
  const lock = (words: string, until: Lock['until'] = null): Lock => ({
    lock: 'cure',
    protects: 'person-or-tool',
    about: before,
    danger: CURE_DANGER,
    words,
    until,
  });
  const till = (range: Lock['until']) => (range && formatTime ? ` till about ${formatTime(range.latest)}` : '');

  if (!joint) return lock(`No glue timer was started at ${name}, so its cure is unknown.`);
  const { phase, unknown, clampEnd, cureEnd } = joint;
  if (phase === 'open') return lock(`${upper(name)}: the clamps are not on yet.`);
  if (unknown === 'too-cold')
    return lock(`${upper(name)}, was glued colder than its glue allows: whether it holds is unknown.`);
  if (phase === 'in-clamps') {
    const cures = need === 'cured' && cureEnd ? `, and cures${till(cureEnd)}` : '';
    return lock(`Not yet: ${name}, is in clamps${till(clampEnd)}${cures}.`, need === 'cured' ? cureEnd : clampEnd);
  }
  if (phase === 'cured') return null;
  if (need === 'clamps-off') {
    if (!clampEnd || now >= clampEnd.earliest) return null;
    return lock(
      `Not yet: the clamps of ${name}, came off early; it would have been in them${till(clampEnd)}.`,
      clampEnd,
    );
  }
  if (unknown) return lock(`${upper(name)}: how long its glue cures is unknown here. Go by the label.`);
  return lock(`Not yet: ${name}, is curing${till(cureEnd)}.`, cureEnd);
}

const upper = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);
